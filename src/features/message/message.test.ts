import { describe, expect, it } from 'vitest';
import {
  isNews,
  mayMove,
  messageMoves,
  messageStates,
  readProviderStatus,
  stateOfStatus,
} from './message.ts';

describe('the states of a message', () => {
  it('end in three that nothing leaves', () => {
    const ends = messageStates.filter((state) => messageMoves[state].length === 0);
    expect(ends).toEqual(['delivered', 'failed', 'cancelled']);
  });

  it('never lead from sent back to sending', () => {
    expect(mayMove('sent', 'waiting')).toBe(false);
    expect(mayMove('sent', 'sending')).toBe(false);
    expect(mayMove('unsure', 'waiting')).toBe(true);
  });

  it('can each be reached from waiting', () => {
    const reached = new Set(['waiting']);
    for (const state of reached) for (const next of messageMoves[state as 'waiting']) reached.add(next);
    expect([...reached].sort()).toEqual([...messageStates].sort());
  });
});

describe('what the service says', () => {
  it('only rises, whatever the order it comes in', () => {
    expect(isNews(null, 'accepted')).toBe(true);
    expect(isNews('accepted', 'sent')).toBe(true);
    expect(isNews('delivered', 'sent')).toBe(false);
    expect(isNews('sent', 'sent')).toBe(false);
    expect(isNews('undelivered', 'delivered')).toBe(false);
  });

  it('is known in its own words', () => {
    expect(readProviderStatus('queued')).toBe('accepted');
    expect(readProviderStatus('failed')).toBe('undelivered');
    expect(readProviderStatus('received')).toBeUndefined();
    expect(stateOfStatus('undelivered')).toBe('failed');
    expect(stateOfStatus('accepted')).toBe('sent');
  });
});
