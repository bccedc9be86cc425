import { describe, expect, it } from 'vitest';
import { mostAttempts, nextPause, retryPauses } from './retry-plan.ts';

describe('pauses between attempts', () => {
  it('grow from five seconds to an hour and end after the eighth attempt', () => {
    const pauses = Array.from({ length: 8 }, (_, place) => nextPause({ attempts: place + 1, random: 0.5 }));
    expect(pauses).toEqual([5e3, 15e3, 60e3, 300e3, 900e3, 1800e3, 3600e3, null]);
    expect(mostAttempts).toBe(8);
  });

  it('are spread by a fifth at most', () => {
    expect(nextPause({ attempts: 1, random: 0 })).toBe(4000);
    expect(nextPause({ attempts: 1, random: 0.999999 })).toBe(6000);
    expect(retryPauses).toHaveLength(7);
  });

  it('are never shorter than the service asks', () => {
    expect(nextPause({ attempts: 1, random: 0.5, retryAfterSeconds: 60 })).toBe(60_000);
    expect(nextPause({ attempts: 4, random: 0.5, retryAfterSeconds: 60 })).toBe(300_000);
  });

  it('need a first attempt', () => {
    expect(() => nextPause({ attempts: 0, random: 0.5 })).toThrow(RangeError);
  });
});
