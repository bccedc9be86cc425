import type { AdviceFact } from '../../lib/doe/index.ts';
import { resultWords } from './result-words.ts';
import { sentences, type Wording } from './wording.ts';

type Check<Kind extends AdviceFact['kind']> = Extract<AdviceFact, { kind: Kind }>;
type CheckFact = Check<'held' | 'fell-short' | 'not-sure-yet'>;

/** A gain of check runs: better is above zero, whatever better is. */
function sayGain(wording: Wording, gain: number, interval: CheckFact['values']['interval']): string {
  const { t } = wording;
  if (gain === 0) return t('verdict:confirmation.same');
  const amount = resultWords(wording).size(gain, interval);
  return t(`verdict:confirmation.${gain > 0 ? 'better' : 'worse'}`, { amount });
}

/** Gains of counts lie on a scale of their own: only their sense can be said. */
function mannerOf({ view }: Wording): 'figure' | 'counted' {
  return view.brief.response.kind === 'measured' ? 'figure' : 'counted';
}

function sayHeld({ values }: Check<'held'>, wording: Wording): string {
  return wording.t(`verdict:confirmation.held.${mannerOf(wording)}`, {
    gain: resultWords(wording).size(values.gain, values.interval),
  });
}

function sayWhyShort({ values }: Check<'fell-short'>, wording: Wording): string {
  const words = resultWords(wording);
  return wording.t(`verdict:confirmation.because.${values.because}.${mannerOf(wording)}`, {
    gain: sayGain(wording, values.gain, values.interval),
    predicted: sayPredicted(values.predicted, wording),
    worth: words.figure(wording.view.brief.response.worthHaving ?? 0),
  });
}

/** The range that the gain was expected in; its low end may be a loss. */
function sayPredicted(predicted: readonly [number, number], wording: Wording): string {
  const { range } = resultWords(wording);
  return wording.t('verdict:confirmation.better', { amount: range(predicted) });
}

export const confirmationSayings = {
  held: sayHeld,
  'fell-short': (fact: Check<'fell-short'>, wording: Wording) =>
    sentences([wording.t('verdict:confirmation.fellShort'), sayWhyShort(fact, wording)]),
  'not-sure-yet': ({ values }: Check<'not-sure-yet'>, wording: Wording) =>
    wording.t(`verdict:confirmation.notSure.${mannerOf(wording)}`, {
      count: values.furtherPairs,
      gain: sayGain(wording, values.gain, values.interval),
    }),
};
