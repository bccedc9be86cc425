import { describe, expect, it } from 'vitest';
import { verdictCase } from '../../../tests/builders/verdict-cases.ts';
import { decidable } from './decidable.ts';

describe('decidable', () => {
  it('offers check runs until some are in', () => {
    expect(decidable(verdictCase('strong'))).toEqual({ mayDecide: true, checkPairs: 3, why: null });
    expect(decidable(verdictCase('held')).checkPairs).toBeNull();
  });

  it('lets nobody act on an older verdict, before the engineer, or after the end', () => {
    const view = verdictCase('strong');
    expect(decidable({ ...view, isLatest: false }).mayDecide).toBe(false);
    expect(decidable({ ...view, reviewDue: true })).toEqual({
      mayDecide: false,
      checkPairs: null,
      why: 'wait',
    });
    expect(decidable({ ...view, state: 'closed', mayDecide: false }).why).toBe('closed');
  });
});
