import type { Language } from '../../i18n/languages.ts';
import type { Brief, Fact } from '../../lib/doe/index.ts';
import { type FactTranslate, factSpeech } from './fact-speech.ts';
import { reasonWords } from './reason-words.ts';
import { warningWords } from './warning-words.ts';

/** `good`: what a plan can do. `caution`: what to know or do before taking it. `info`: what its promises rest on. */
export interface FactLine {
  kind: Fact['kind'];
  tone: 'good' | 'caution' | 'info';
  words: string;
}

const cautions = new Set<Fact['kind']>([
  'main-effects-tied-to-pairs',
  'block-too-small',
  'hard-setting-not-judged',
  'no-error-estimate',
  'few-rejects',
  'middle-touches-rule',
  'one-at-a-time-would-do',
]);

/**
 * Facts of a proposal in plain words, with the shop's own names of `brief`. Facts that no plan is the subject of are left
 * out, and what would be said twice is said once.
 * @param t of the namespace `plan-facts`
 */
export function planFactLines(
  facts: readonly Fact[],
  brief: Brief,
  t: FactTranslate,
  language: Language,
): FactLine[] {
  const speech = factSpeech(brief, t, language);
  const lines = facts.flatMap((fact): FactLine[] => {
    const reason = reasonWords(fact, speech);
    if (reason !== null) return [{ kind: fact.kind, tone: 'good', words: reason }];
    const warning = warningWords(fact, speech);
    if (warning === null) return [];
    return [{ kind: fact.kind, tone: cautions.has(fact.kind) ? 'caution' : 'info', words: warning }];
  });
  return lines.filter(({ words }, place) => lines.findIndex((line) => line.words === words) === place);
}
