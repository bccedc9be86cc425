import { type Fact, isAdviceFact } from '../../lib/doe/index.ts';
import { trustSayings } from './trust-words.ts';
import type { Wording } from './wording.ts';

/** While runs are out only these are said: they help to save the trial, and tell nothing of any setting. */
export const runningKinds = ['odd-reading', 'drift-seen', 'no-drift-seen', 'drift-not-judged'] as const;

/** @throws RangeError for a fact that is not said before the end */
export function sayRunningFact(fact: Fact, wording: Wording): string {
  if (isAdviceFact(fact)) {
    switch (fact.kind) {
      case 'odd-reading':
        return trustSayings['odd-reading'](fact, wording);
      case 'drift-seen':
        return trustSayings['drift-seen'](fact, wording);
      case 'no-drift-seen':
        return trustSayings['no-drift-seen'](fact, wording);
      case 'drift-not-judged':
        return trustSayings['drift-not-judged'](fact, wording);
    }
  }
  throw new RangeError(`sayRunningFact: ${fact.kind} is not said while runs are out`);
}
