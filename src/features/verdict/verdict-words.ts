import { type AdviceFact, type Fact, isAdviceFact } from '../../lib/doe/index.ts';
import { callSayings } from './call-words.ts';
import { confirmationSayings } from './confirmation-words.ts';
import { detailSayings } from './detail-words.ts';
import { type HeadlineWording, headlineSayings } from './headline-words.ts';
import { limitSayings } from './limit-words.ts';
import { nextSayings, reasonSayings } from './next-words.ts';
import { trustSayings } from './trust-words.ts';

type Sayings = {
  [Kind in AdviceFact['kind']]: (
    fact: Extract<AdviceFact, { kind: Kind }>,
    wording: HeadlineWording,
  ) => string;
};

/** Every kind of fact that a verdict may hold, each with its sentences; a kind without words is a type error. */
const sayings: Sayings = {
  ...callSayings,
  ...detailSayings,
  ...trustSayings,
  ...limitSayings,
  ...headlineSayings,
  ...nextSayings,
  ...reasonSayings,
  ...confirmationSayings,
};

/**
 * A fact of a verdict in plain sentences, with the shop's own names and units.
 *
 * @throws RangeError for a fact that is not said after the runs
 */
export function sayFact(fact: Fact, wording: HeadlineWording): string {
  if (!isAdviceFact(fact)) throw new RangeError(`sayFact: ${fact.kind} is not said of a verdict`);
  const say = sayings[fact.kind] as (fact: AdviceFact, wording: HeadlineWording) => string;
  return say(fact, wording);
}
