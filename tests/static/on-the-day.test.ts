import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';

const run = 'tests/integration/run';

/** What may happen on the day, and the tests that walk it: file and title. */
const walked: Record<string, readonly (readonly [file: string, title: string])[]> = {
  'the machine breaks down': [
    [
      `${run}/running-trial.test.ts`,
      'waits with a problem until somebody deals with it, and notes what was changed',
    ],
    [
      `${run}/whole-trial.test.ts`,
      'goes from the first prompt to the usual settings with every kind of reply',
    ],
  ],
  'material runs out, a new batch': [
    [
      `${run}/whole-trial.test.ts`,
      'goes from the first prompt to the usual settings with every kind of reply',
    ],
  ],
  'a setting cannot be reached': [
    [`${run}/settling.test.ts`, 'is made with what was reached: the run stays, and is reminded of again'],
    [
      `${run}/settling.test.ts`,
      'is made later: the run takes its turn after all others, and the next one goes out',
    ],
    [`${run}/settling.test.ts`, 'is ruled out: the run is skipped, and said to be no loss'],
  ],
  'a part cannot be made, or is off the gauge': [
    [`${run}/board.test.ts`, 'may be that a run failed or went beyond the gauge, or all that there will be'],
  ],
  'settling and scrap at a change': [
    ['src/features/trial/run-prompt-of.test.ts', 'says what the answers and the plan say'],
  ],
  'the first run of a shift on a cold machine': [
    [`${run}/settling.test.ts`, 'may be a warm-up that does not count, at the usual settings'],
  ],
  'a long stop': [
    [
      `${run}/settling.test.ts`,
      'may be a middle run after a long stop, which counts as one of those in the plan',
    ],
  ],
  'measured after an hour, or by the lab tomorrow': [
    [
      `${run}/on-the-day.test.ts`,
      'sends the next run after DONE, and asks the lab for the numbers with run and label',
    ],
    [
      `${run}/four-languages.test.ts`,
      'runs eleven runs with two results over two shifts and a lab, in four languages, to the usual settings',
    ],
  ],
  'two people measure': [[`${run}/night-shift.test.ts`, 'keeps with each reading who sent it']],
  'a night shift': [
    [`${run}/night-shift.test.ts`, 'calls whoever is on call then, and lets the day’s supervisor sleep'],
    [`${run}/on-the-day.test.ts`, 'is left alone outside its work hours'],
  ],
  'a person goes home': [
    [
      `${run}/four-languages.test.ts`,
      'runs eleven runs with two results over two shifts and a lab, in four languages, to the usual settings',
    ],
  ],
  'a person leaves the firm': [
    ['tests/integration/people/leaving.test.ts', 'waits for open runs to be handed over, and names them'],
  ],
  'given up half way': [
    [`${run}/running-trial.test.ts`, 'ends early: open runs are skipped, those that are done stay'],
    [`${run}/settling.test.ts`, 'says that the machine is not set back until somebody says it is'],
  ],
  'a wrong number is sent': [
    [`${run}/on-the-day.test.ts`, 'asks whether a very quick number is for this run or the one before'],
    [`${run}/on-the-day.test.ts`, 'keeps two readings of one run and asks which is right'],
  ],
  'a phone is flat or lost': [
    [
      `${run}/settling.test.ts`,
      'says that texts do not arrive after two, and a run that was handed over starts afresh',
    ],
  ],
};

describe.each(Object.entries(walked))('%s', (_what, tests) => {
  it.each(tests)('is walked by %s: %s', (file, title) => {
    expect(readFileSync(file, 'utf8')).toContain(`it('${title}'`);
  });
});
