import type { StarterName } from './answer-choices.ts';
import type { Answers } from './answers.schema.ts';
import { baking } from './starters/baking.ts';
import { coating } from './starters/coating.ts';
import { cutting } from './starters/cutting.ts';
import { drying } from './starters/drying.ts';
import { filling } from './starters/filling.ts';
import { gluing } from './starters/gluing.ts';
import { machining } from './starters/machining.ts';
import { mixing } from './starters/mixing.ts';
import { moulding } from './starters/moulding.ts';
import { printing } from './starters/printing.ts';
import { sealing } from './starters/sealing.ts';
import { soldering } from './starters/soldering.ts';
import { type Starter, type StarterWords, typeStarter } from './starters/starter.ts';

const starters: Record<Exclude<StarterName, 'blank'>, (t: StarterWords) => Starter> = {
  sealing,
  moulding,
  coating,
  machining,
  baking,
  gluing,
  mixing,
  drying,
  cutting,
  soldering,
  filling,
  printing,
};

/** The usual answers of a common shop problem, in the reader's words, as if typed: examples to change. Blank gives none. */
export function starterAnswers(name: StarterName, t: StarterWords): Answers {
  if (name === 'blank') return {};
  return typeStarter(starters[name](t), t('decimalMark'));
}
