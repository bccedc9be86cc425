import { describe, expect, it } from 'vitest';
import {
  type Example,
  factorialExamples,
  toAnalysisInput,
} from '../../../../tests/builders/reference-examples.ts';
import { analyzeAlternative } from './alternative.ts';
import { AnalysisError } from './analysis.ts';
import { analyze } from './analyze.ts';
import { plotEffects } from './effect-plot.ts';
import { predict } from './predict.ts';
import { predictInUnit } from './predict-in-unit.ts';
import { listRunChecks } from './run-checks.ts';
import { listTermVariances } from './term-variance.ts';
import { figureBehind, type Transform, transformFigure } from './transforms.ts';

function example(id: string): Example {
  const found = factorialExamples.find((each) => each.id === id);
  if (!found) throw new RangeError(`no example ${id}`);
  return found;
}

const filtration = example('filtration-2-4');
const drill = example('drill-2-4');

describe('the half-normal plot', () => {
  it('holds every contrast of the published experiment with its own limit', () => {
    const input = toAnalysisInput(filtration, { error: 'ladder' });
    const analysis = analyze(input);
    const plot = plotEffects(input, analysis);
    expect(plot.effects).toHaveLength(15);
    expect(plot.lenth?.pse).toBeCloseTo(filtration.computed.lenth?.PSE ?? 0, 9);
    for (const { term, effect } of plot.effects)
      expect(effect).toBeCloseTo(filtration.computed.effects?.[term] ?? Number.NaN, 9);
    const sizes = plot.effects.map(({ size }) => size);
    expect(sizes).toEqual([...sizes].sort((first, second) => first - second));
    // Of fifteen, the largest stands at the quantile of 1/2 + (14.5/15)/2 (R: qnorm).
    expect(plot.effects.at(-1)?.score).toBeCloseTo(2.128045234185, 10);
    expect(plot.effects.at(-1)?.term).toBe('A');
    const limitOf = (term: string) => plot.effects.find((each) => each.term === term)?.limit;
    const [low, high] = analysis.terms.find(({ term }) => term === 'A')?.ci ?? [0, 0];
    expect(limitOf('A')).toBeCloseTo((high - low) / 2, 12);
    expect(limitOf('ABCD')).toBeNull();
  });
});

describe('another model', () => {
  const logModel = Object.entries(drill.computed.models ?? {}).find(([name]) => name.startsWith('ln y'));

  it('on logarithms is the published one', () => {
    const [, model] = logModel ?? [];
    const { analysis, added } = analyzeAlternative(toAnalysisInput(drill, {}), {
      terms: model?.terms ?? [],
      transform: { kind: 'log' },
      error: 'residual',
    });
    expect(added).toEqual([]);
    expect(analysis.terms.length).toBeGreaterThan(0);
    for (const { term, coefficient, ss } of analysis.terms) {
      expect(coefficient).toBeCloseTo(model?.table[term]?.coefficient ?? Number.NaN, 10);
      expect(ss).toBeCloseTo(model?.table[term]?.ss ?? Number.NaN, 10);
    }
  });

  it('keeps the hierarchy unless it is refused', () => {
    const base = toAnalysisInput(filtration, {});
    const wish = { terms: ['ACD'], error: 'residual' as const };
    const kept = analyzeAlternative(base, wish);
    expect(kept.added).toEqual(['A', 'C', 'D', 'AC', 'AD', 'CD']);
    const refused = analyzeAlternative(base, { ...wish, refuseHierarchy: true });
    expect(refused.analysis.terms.map(({ term }) => term)).toEqual(['ACD']);
  });

  it('leaves a run out and takes stretches as blocks', () => {
    const base = toAnalysisInput(filtration, {});
    const wish = { terms: ['A', 'C', 'D'], error: 'residual' as const };
    const shorter = analyzeAlternative(base, { ...wish, without: [3] });
    expect(shorter.analysis.used).not.toContain(3);
    expect(shorter.analysis.n).toBe(15);
    const stretches = base.runs.map((_, place) => (place < 8 ? 'before' : 'after'));
    const split = analyzeAlternative(base, { ...wish, terms: ['A', 'C'], stretches });
    // In standard order D changes after the eighth run, so its sum of squares is that of the stretches.
    const blocks = split.analysis.anova.find(({ source }) => source === 'blocks');
    expect(blocks?.ss).toBeCloseTo(filtration.computed.ss?.['D'] ?? Number.NaN, 8);
  });

  it('refuses a scale on which a reading has no place', () => {
    const base = toAnalysisInput(filtration, {});
    const runs = base.runs.map((run, place) => (place === 2 ? { ...run, y: 0 } : run));
    const wish = { terms: ['A'], transform: { kind: 'log' } as const };
    expect(() => analyzeAlternative({ ...base, runs }, wish)).toThrow(AnalysisError);
  });

  it.each<Transform>([
    { kind: 'none' },
    { kind: 'log' },
    { kind: 'sqrt' },
    { kind: 'arcsine' },
    { kind: 'boxCox', lambda: -0.5 },
    { kind: 'boxCox', lambda: 0 },
    { kind: 'boxCox', lambda: 2 },
  ])('comes back from its scale: %o', (transform) => {
    for (const y of [0.04, 0.5, 0.93])
      expect(figureBehind(transform, transformFigure(transform, y) ?? Number.NaN)).toBeCloseTo(y, 12);
    expect(transformFigure({ kind: 'boxCox', lambda: 1 }, 7)).toBeCloseTo(6, 12);
    expect(transformFigure({ kind: 'arcsine' }, 1.2)).toBeNull();
  });
});

describe('the figures of runs and terms', () => {
  it('are those of the reference programs', () => {
    let compared = 0;
    for (const each of factorialExamples)
      for (const model of Object.values(each.computed.models ?? {})) {
        if (model.blocksInModel || model.hasCurvatureTerm || model.rows.length !== each.runs.length) continue;
        const input = toAnalysisInput(each, { terms: model.terms, curvatureTerm: false });
        const rows = listRunChecks(input, analyze(input));
        if (Math.abs((model.rows[0]?.fitted ?? 0) - (rows[0]?.fitted ?? 0)) > 1e-6) continue;
        rows.forEach((row, place) => {
          expect(row.residual).toBeCloseTo(model.rows[place]?.residual ?? Number.NaN, 8);
          expect(row.leverage).toBeCloseTo(model.rows[place]?.leverage ?? Number.NaN, 8);
          expect(row.y).toBeCloseTo(each.runs[place]?.y ?? Number.NaN, 8);
          compared += 1;
        });
      }
    expect(compared).toBeGreaterThan(200);
  });

  it('give F as the square of t, and the residual the score of its rank', () => {
    const input = toAnalysisInput(filtration, { terms: ['A', 'C', 'D', 'AC', 'AD'] });
    const analysis = analyze(input);
    for (const [place, { f, ss }] of listTermVariances(analysis).entries()) {
      expect(f).toBeCloseTo((analysis.terms[place]?.t ?? Number.NaN) ** 2, 10);
      expect((f ?? 0) * (analysis.error.sd ?? 0) ** 2).toBeCloseTo(ss, 8);
    }
    const rows = listRunChecks(input, analysis).sort((first, second) => first.residual - second.residual);
    // Blom's positions of sixteen (R: qnorm(ppoints(16, 3/8))).
    expect(rows[0]?.score).toBeCloseTo(-1.768825038519, 10);
    expect(rows.reduce((sum, { score }) => sum + score, 0)).toBeCloseTo(0, 12);
  });
});

describe('a prediction in the unit', () => {
  it('is turned back from the scale', () => {
    const input = toAnalysisInput(drill, { scale: 'log', terms: ['B', 'C', 'D'] });
    const analysis = analyze(input);
    const x = [0, 1, 1, -1];
    const there = predict(analysis, x);
    const back = predictInUnit(analysis, x);
    expect(back.fit).toBeCloseTo(Math.exp(there.fit), 12);
    expect(back.ci?.[0]).toBeCloseTo(Math.exp(there.ci?.[0] ?? 0), 12);
  });
});
