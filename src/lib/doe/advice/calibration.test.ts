import { describe, expect, it } from 'vitest';
import { calibrate } from '../../../../tests/bench/verdict/calibration.ts';
import { simulateConfirmation } from '../../../../tests/bench/verdict/confirmation.ts';
import { PLANS, WHOLE_PLOT_PLANS } from '../../../../tests/bench/verdict/plans.ts';
import { createRandomSource } from '../../../../tests/bench/verdict/simulation.ts';
import { measureWorth } from '../../../../tests/bench/verdict/worth.ts';
import { REGULARITIES } from './effect-regularities.ts';

// Short versions, with fixed seeds, of `npm run bench:verdict`; its tables stand in tests/reports. Bounds are the promise plus four standard errors.
const EXPERIMENTS = 200;
const atMost = (share: number) => share + 4 * Math.sqrt((share * (1 - share)) / EXPERIMENTS);

const scenarios = [...PLANS, ...WHOLE_PLOT_PLANS]
  .filter(({ runs }) => runs.length <= 20)
  .map((plan) => ({ plan, active: plan.active.at(-1) ?? 0 }));

describe('calls', () => {
  it.each(scenarios)('are rarely false: $plan.name, $active active', ({ plan, active }) => {
    const found = calibrate({
      plan,
      active,
      size: 3,
      experiments: EXPERIMENTS,
      random: createRandomSource(11),
      plotSd: 1,
    });
    expect(found.falseLikely / Math.max(1, found.nulls)).toBeLessThan(atMost(0.055));
    expect(found.anyFalseClear / EXPERIMENTS).toBeLessThan(atMost(0.055));
    expect(found.covered / found.intervals).toBeGreaterThan(0.925);
  });
});

describe('advice', () => {
  it('comes near the choice that knows noise and effect size, and beats acting on what is significant', () => {
    const { shares } = measureWorth({
      cell: { factors: 4, runs: 16, noise: 1 },
      processes: 120,
      random: createRandomSource(13),
    });
    expect(shares.bestBet).toBeGreaterThan(shares.shrunken - 0.03);
    expect(shares.bestBet).toBeGreaterThan(shares.significantOnly + 0.15);
  });

  it('does not take interactions as large as main effects for noise', () => {
    const { shares } = measureWorth({
      cell: { factors: 5, runs: 16, noise: 0.25 },
      processes: 100,
      random: createRandomSource(19),
      rules: { ...REGULARITIES, size: [0, 1, 1, 1] },
    });
    expect(shares.bestBet).toBeGreaterThan(shares.allEstimates - 0.03);
  });

  it('predicts what check runs will show', () => {
    const found = simulateConfirmation({ trials: 200, noise: 0.25, random: createRandomSource(17) });
    expect(found.covered / found.trials).toBeGreaterThan(0.89);
    expect(found.covered / found.trials).toBeLessThan(0.99);
    expect(found.effectsCovered / found.effects).toBeGreaterThan(0.93);
  });
});
