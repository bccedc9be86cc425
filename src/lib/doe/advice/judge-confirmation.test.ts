import { describe, expect, it } from 'vitest';
import { readTrial, wobble } from '../../../../tests/builders/read-trial.ts';
import { judgeConfirmation } from './judge-confirmation.ts';
import { confirmationVerdictSchema } from './verdict.ts';

describe('judgeConfirmation', () => {
  const noise = wobble(53, 0.3);
  const { brief, bet } = readTrial((x) => 35 + 2 * (x[0] ?? 0) + (x[1] ?? 0) + noise());

  it('holds, whatever the day', () => {
    const held = judgeConfirmation(brief, bet, { atBest: [38, 37.8, 38.3], atUsual: [35.1, 34.9, 35.2] });
    expect(held.outcome).toBe('held');
    const badDay = judgeConfirmation(brief, bet, { atBest: [28, 27.8, 28.3], atUsual: [25.1, 24.9, 25.2] });
    expect({ ...badDay, facts: [] }).toEqual({
      ...held,
      gain: expect.closeTo(held.gain, 9),
      interval: held.interval?.map((end) => expect.closeTo(end, 9)),
      facts: [],
    });
    confirmationVerdictSchema.parse(held);
  });

  it('falls short below the prediction and stays open where the spread hides the gain', () => {
    const short = judgeConfirmation(brief, bet, { atBest: [34, 34.2, 34.1], atUsual: [35.1, 34.9, 35.2] });
    expect(short).toMatchObject({
      outcome: 'fellShort',
      facts: [{ values: { because: 'below-prediction' } }],
    });
    const open = judgeConfirmation(brief, bet, { atBest: [42, 33, 39], atUsual: [31, 38, 36] });
    expect(open.outcome).toBe('notSureYet');
    expect(open.furtherPairs).toBeGreaterThan(0);
  });

  it('falls short when a watched limit is crossed', () => {
    const watch = [{ name: 'burn', unit: 'mm', kind: 'measured' as const, goal: 'less' as const, upper: 2 }];
    const crossed = judgeConfirmation({ ...brief, watch }, bet, {
      atBest: [38, 37.8, 38.3],
      atUsual: [35.1, 34.9, 35.2],
      watchedAtBest: [[2.1, 2.4, 1.9]],
    });
    expect(crossed).toMatchObject({
      outcome: 'fellShort',
      facts: [{ values: { because: 'limit-crossed' } }],
    });
  });

  it('refuses readings that are none', () => {
    expect(() => judgeConfirmation(brief, bet, { atBest: [], atUsual: [1] })).toThrow(RangeError);
    expect(() => judgeConfirmation(brief, bet, { atBest: [Number.NaN], atUsual: [1] })).toThrow(RangeError);
  });
});
