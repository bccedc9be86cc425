import { describe, expect, it } from 'vitest';
import { regularPlan } from '../../../../tests/builders/random-process.ts';
import { kindsOf, middles, readTrial, wobble } from '../../../../tests/builders/read-trial.ts';
import { buildBrief, buildInput, buildResult, planOf } from '../../../../tests/builders/simulated-trial.ts';
import { createUniformSource } from '../random/random-numbers.ts';
import { bestBet } from './best-bet.ts';
import { judge } from './judge.ts';
import { verdictSchema } from './verdict.ts';

describe('judge', () => {
  it('calls a big effect, a small one and none by their intervals against W', () => {
    const noise = wobble(3, 0.05);
    const { verdict } = readTrial((x) => 35 + 2 * (x[0] ?? 0) + 0.2 * (x[1] ?? 0) + noise());
    expect(kindsOf(verdict.settings)).toEqual([
      'matters',
      'real-but-small',
      'no-real-difference',
      'no-real-difference',
    ]);
    expect(verdict.settings[0]).toMatchObject({
      values: { settled: true, sure: 'clear' },
      refs: { factors: ['A'] },
    });
    expect(verdict.headline.kind).toBe('clear-gain');
    expect(kindsOf(verdict.next)).toContain('check-runs');
    verdictSchema.parse(verdict);
  });

  it('gives a setting its change on either side of a partner with which it works together', () => {
    const noise = wobble(5, 0.05);
    const { verdict } = readTrial((x) => 35 + 2 * (x[0] ?? 0) * (x[1] ?? 0) + noise());
    expect(verdict.settings[0]).toMatchObject({
      kind: 'depends-on-partner',
      refs: { terms: ['A', 'AB'], factors: ['A', 'B'] },
    });
    const [pair] = verdict.pairs;
    expect(pair).toMatchObject({ kind: 'matters', refs: { terms: ['AB', 'CD'] } });
    expect(kindsOf(verdict.details)).toContain('pair-corners');
    // C and D may own the tied sum: they are never said to make no difference.
    expect(kindsOf(verdict.settings)).not.toContain('no-real-difference');
    expect(verdict.next).toContainEqual({ kind: 'untie', values: {}, refs: { terms: ['AB', 'CD'] } });
  });

  it('never says no difference of a number setting when the middle may be off the line', () => {
    const noise = wobble(7, 0.05);
    const { verdict, bet } = readTrial((x) => 35 + (x[0] === 0 ? 3 : 0) + noise());
    expect(kindsOf(verdict.settings)).not.toContain('no-real-difference');
    expect(kindsOf(verdict.trust)).toContain('bends');
    expect(kindsOf(verdict.next)).toContain('follow-the-curve');
    expect(kindsOf(bet.reasons)).toContain('only-what-was-run');
    expect(bet.coded).toEqual([0, 0, 0, 0]);
  });

  it('says what would settle an open call, and keeps today where nothing is to be gained', () => {
    const noise = wobble(11, 1);
    const { verdict } = readTrial(() => 35 + noise());
    expect(kindsOf(verdict.settings)).toContain('cant-tell');
    expect(kindsOf(verdict.details)).toContain('would-settle');
    const quiet = wobble(13, 0.02);
    const still = readTrial(() => 35 + quiet());
    expect(still.bet.keepToday).toBe(true);
    expect(still.verdict.headline.kind).toBe('nothing-makes-a-difference');
    expect(kindsOf(still.verdict.next)).toContain('keep-today');
  });

  it('makes no calls by least squares after failed runs, names their cause and stays away from it', () => {
    const noise = wobble(17, 0.1);
    const points = regularPlan(3, [[0, 1, 2]]);
    const ends = points.map((x) => (x[0] === 1 && x[1] === 1 ? { end: 'failed' as const, y: null } : {}));
    const { verdict, bet } = readTrial(
      (x) => 35 + 2 * (x[0] ?? 0) + 2 * (x[1] ?? 0) + noise(),
      buildBrief(4),
      ends,
    );
    expect(verdict.headline).toMatchObject({ kind: 'some-runs-failed', values: { runs: 2 } });
    expect(verdict.settings).toEqual([]);
    expect(verdict.trust).toContainEqual({
      kind: 'failed-together',
      values: { levels: [1, 1] },
      refs: { factors: ['A', 'B'], results: [0] },
    });
    expect(bet.coded[0] === 1 && bet.coded[1] === 1).toBe(false);
  });

  it('keeps away from where a watched figure could not be read, and judges the main result all the same', () => {
    const noise = wobble(17, 0.1);
    const points = [...regularPlan(3, [[0, 1, 2]]), ...middles(4, 4)];
    const spec = { name: 'flash', unit: 'mm', kind: 'measured' as const, goal: 'less' as const };
    const brief = buildBrief(4, { watch: [spec] });
    const input = buildInput(
      brief,
      points.map((x) => ({ x, y: 35 + 2 * (x[0] ?? 0) + 2 * (x[1] ?? 0) + noise() })),
    );
    const watched = buildInput(
      brief,
      points.map((x) =>
        x[0] === 1 && x[1] === 1
          ? { x, y: null, end: 'beyondGauge' as const }
          : { x, y: 1 + (x[0] ?? 0) + 0.1 * noise() },
      ),
    );
    const results = [buildResult(brief.response, input), buildResult(spec, watched)];
    const verdict = judge(brief, planOf(input), results);
    expect(kindsOf(verdict.settings).slice(0, 2)).toEqual(['matters', 'matters']);
    expect(verdict.headline.kind).toBe('clear-gain');
    expect(verdict.trust).toContainEqual({
      kind: 'runs-failed',
      values: { end: 'beyondGauge', runs: 2 },
      refs: { runs: [3, 7], results: [1] },
    });
    expect(verdict.trust).toContainEqual({
      kind: 'failed-together',
      values: { levels: [1, 1] },
      refs: { factors: ['A', 'B'], results: [1] },
    });
    expect(kindsOf(verdict.next)).toContain('narrow-range');
    expect(verdict.watched).toEqual([]);
    const bet = bestBet(brief, results);
    expect(bet.coded[0] === 1 && bet.coded[1] === 1).toBe(false);
    expect(kindsOf(bet.reasons)).toContain('away-from-failures');
  });

  it('asks for a re-measurement of a reading that all others make unlikely', () => {
    const noise = wobble(19, 0.1);
    const points = [...regularPlan(4), ...middles(4, 3)];
    const brief = buildBrief(4);
    const runs = points.map((x, order) => ({
      x,
      order,
      y: 35 + (x[0] ?? 0) + noise() + (order === 6 ? 4 : 0),
    }));
    const input = buildInput(brief, runs);
    const verdict = judge(brief, planOf(input), [buildResult(brief.response, input)]);
    expect(verdict.trust.filter((fact) => fact.kind === 'odd-reading').map((fact) => fact.refs.runs)).toEqual(
      [[6]],
    );
    expect(kindsOf(verdict.next)).toContain('measure-again');
  });

  it('sees drift over the run order', () => {
    const noise = wobble(23, 0.1);
    const points = [...regularPlan(4), ...middles(4, 3)];
    const uniform = createUniformSource(4);
    const orders = points.map((_, place) => ({ place, key: uniform() })).sort((a, b) => a.key - b.key);
    const brief = buildBrief(4);
    const runs = points.map((x, place) => {
      const order = orders.findIndex((entry) => entry.place === place) + 1;
      return { x, order, y: 35 + 0.3 * order + noise() };
    });
    const input = buildInput(brief, runs);
    const verdict = judge(brief, planOf(input), [buildResult(brief.response, input)]);
    expect(kindsOf(verdict.trust)).toContain('drift-seen');
  });

  it('sees which setting changes the spread between parts', () => {
    const normal = wobble(29, 1);
    const brief = buildBrief(3);
    const runs = [...regularPlan(3), ...middles(3, 4)].map((x) => {
      const sd = x[1] === 1 ? 4 : x[1] === 0 ? 2 : 1;
      const parts = Array.from({ length: 8 }, () => 35 + sd * normal());
      return { x, parts, y: parts.reduce((sum, part) => sum + part, 0) / 8 };
    });
    const input = buildInput(brief, runs);
    const verdict = judge(brief, planOf(input), [buildResult(brief.response, input)]);
    expect(verdict.steadier.map((fact) => fact.refs.factors)).toEqual([['B']]);
    expect(kindsOf(verdict.cannotTell)).toContain('short-term-spread');
  });
});
