import { describe, expect, it } from 'vitest';
import { checkGauge } from './check-gauge.ts';

const duplicates = [
  [35.1, 35.3],
  [36.0, 35.8],
  [33.2, 33.2],
  [37.5, 37.1],
  [34.4, 34.6],
] as const;

describe('checkGauge', () => {
  it('is the root of half the mean squared difference', () => {
    // Differences .2, .2, 0, .4, .2: squares sum to .28, over 2 x 5.
    expect(checkGauge(duplicates, 2)?.sd).toBeCloseTo(Math.sqrt(0.028), 12);
  });

  it('agrees with the pooled standard deviation within parts', () => {
    const within = duplicates.map(([first, second]) => (first - second) ** 2 / 2);
    const pooled = Math.sqrt(within.reduce((sum, variance) => sum + variance, 0) / within.length);
    expect(checkGauge(duplicates, null)?.sd).toBeCloseTo(pooled, 12);
  });

  it('calls a gauge fine or coarse beside the ups and downs, and neither where it cannot know', () => {
    expect(checkGauge(duplicates, 2)?.call).toBe('fine');
    expect(checkGauge(duplicates, 0.4)?.call).toBe('coarse');
    expect(checkGauge(duplicates, null)?.call).toBe('unclear');
    expect(checkGauge(duplicates.slice(0, 2), 2)?.call).toBe('unclear');
    expect(checkGauge([], 2)).toBeNull();
  });
});
