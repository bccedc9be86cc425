import { describe, expect, it } from 'vitest';
import { regularPlan } from '../../../../tests/builders/random-process.ts';
import { middles, readTrial, wobble } from '../../../../tests/builders/read-trial.ts';
import {
  buildBrief,
  buildInput,
  buildResult,
  numberFactor,
} from '../../../../tests/builders/simulated-trial.ts';
import type { Brief } from '../brief.ts';
import { bestBet } from './best-bet.ts';
import { bestBetSchema } from './verdict.ts';

describe('bestBet', () => {
  it('goes to the better end, leaves what gains nothing as it is, and keeps to the dials', () => {
    const noise = wobble(31, 0.01);
    const { bet } = readTrial((x) => 35 + 2 * (x[0] ?? 0) - (x[1] ?? 0) + noise());
    expect(bet.coded).toEqual([1, -1, 0, 0]);
    expect(bet.predicted).toBeCloseTo(38, 0);
    expect(bet.versusUsual).toBeCloseTo(3, 0);
    expect(bet.tested).toBe(false);
    bestBetSchema.parse(bet);
  });

  it('turns round where less is better', () => {
    const brief = buildBrief(4, {
      response: { name: 'gap', unit: 'mm', kind: 'measured', goal: 'less', worthHaving: 1 },
    });
    const noise = wobble(37, 0.05);
    const { bet } = readTrial((x) => 35 + 2 * (x[0] ?? 0) + noise(), brief);
    expect(bet.coded[0]).toBe(-1);
    expect(bet.versusUsual).toBeLessThan(-1);
    expect(bet.chanceBetter).toBeGreaterThan(0.99);
  });

  it('meets a target between low and high', () => {
    const brief = buildBrief(4, {
      response: { name: 'weight', unit: 'g', kind: 'measured', goal: 'target', target: 36, worthHaving: 0.5 },
    });
    const noise = wobble(41, 0.02);
    const { bet } = readTrial((x) => 35 + 3 * (x[0] ?? 0) + noise(), brief);
    expect(bet.predicted).toBeCloseTo(36, 1);
  });

  it('never proposes what is forbidden and keeps watched limits', () => {
    const watch = [{ name: 'burn', unit: 'mm', kind: 'measured' as const, goal: 'less' as const, upper: 2 }];
    const brief: Brief = buildBrief(4, { watch, forbidden: [{ A: 1, C: 1 }] });
    const points = [...regularPlan(3, [[0, 1, 2]]), ...middles(4, 4)];
    const noise = wobble(43, 0.05);
    const strength = buildInput(
      brief,
      points.map((x) => ({ x, y: 35 + 3 * (x[0] ?? 0) + 2 * (x[1] ?? 0) + (x[2] ?? 0) + noise() })),
    );
    const burn = buildInput(
      brief,
      points.map((x) => ({ x, y: 1.5 + (x[1] ?? 0) + noise() })),
    );
    const [spec] = watch;
    if (spec === undefined) throw new Error('no watched result');
    const bet = bestBet(brief, [buildResult(brief.response, strength), buildResult(spec, burn)]);
    expect(bet.coded[0]).toBe(1);
    expect(bet.coded[2]).toBeLessThanOrEqual(0);
    expect(bet.coded[1]).toBeLessThan(1);
    expect(bet.allLimits).toBeGreaterThan(0.9);
    expect(bet.watched).toHaveLength(1);
  });

  it('keeps to the steps of a dial', () => {
    const factors = [
      numberFactor(0, { low: 140, high: 160, usual: 150, step: 1 }),
      numberFactor(1),
      numberFactor(2),
      numberFactor(3),
    ];
    const brief = buildBrief(factors, {
      response: {
        name: 'weight',
        unit: 'g',
        kind: 'measured',
        goal: 'target',
        target: 35.43,
        worthHaving: 0.1,
      },
    });
    const noise = wobble(47, 0.01);
    const { bet } = readTrial((x) => 35 + (x[0] ?? 0) + noise(), brief);
    expect(Number.isInteger(bet.actual[0])).toBe(true);
  });
});
