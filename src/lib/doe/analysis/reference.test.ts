import { describe, expect, it } from 'vitest';
import { factorialExamples, toAnalysisInput } from '../../../../tests/builders/reference-examples.ts';
import type { Analysis, TermEstimate } from './analysis.ts';
import { analyze } from './analyze.ts';
import { predict } from './predict.ts';

/** Relative to the value, or to the scale of the readings where the value is zero in exact arithmetic. */
function expectClose(actual: number | null | undefined, wanted: number, scale: number, what: string) {
  expect(actual, what).not.toBeNull();
  const error = Math.abs((actual ?? Number.NaN) - wanted);
  expect(error, `${what}: ${actual} against ${wanted}`).toBeLessThanOrEqual(
    1e-9 * Math.abs(wanted) + 1e-10 * scale,
  );
}

const find = (analysis: Analysis, term: string): TermEstimate | undefined =>
  analysis.terms.find((entry) => entry.term === term);

// Every number was computed with R 4.2.2 and again with numpy, which agree to 2e-11.
describe.each(factorialExamples)('$id ($source)', (example) => {
  const readings = example.runs.map((run) => run.y);
  const scale = Math.max(...readings) - Math.min(...readings);
  const { computed } = example;

  const { effects, lenth: limits } = computed;
  if (effects !== undefined)
    it('has the effects and sums of squares of all estimable terms', () => {
      const blocks = new Set(example.runs.map((run) => run.block)).size > 1;
      const analysis = analyze(
        toAnalysisInput(example, { terms: Object.keys(effects), curvatureTerm: false, blocks }),
      );
      expect(analysis.terms.map(({ term }) => term)).toEqual(Object.keys(effects));
      for (const [term, effect] of Object.entries(effects)) {
        expectClose(find(analysis, term)?.effect, effect, scale, `effect ${term}`);
        const ss = computed.ss?.[term] ?? Number.NaN;
        expectClose(find(analysis, term)?.ss, ss, scale * scale, `ss ${term}`);
      }
      expectClose(analysis.intercept.coefficient, computed.mean ?? Number.NaN, scale, 'mean');
      expect(analysis.confoundedWithBlocks).toEqual(computed.design?.confoundedWithBlocks ?? []);
      for (const [term, words] of Object.entries(computed.design?.aliases ?? {})) {
        const found = analysis.aliases.find((alias) => alias.term === term);
        const signed = found?.with.map((other) => (other.coefficient < 0 ? `-${other.term}` : other.term));
        if (found) expect(new Set(signed), `aliases of ${term}`).toEqual(new Set(words));
      }
    });

  if (limits !== undefined)
    it('has the published limits for unreplicated effects', () => {
      const blocks = new Set(example.runs.map((run) => run.block)).size > 1;
      const { lenth } = analyze(toAnalysisInput(example, { blocks }));
      expectClose(lenth?.s0, limits.s0, scale, 's0');
      expectClose(lenth?.pse, limits.PSE, scale, 'PSE');
      expectClose(lenth?.me, limits.ME, scale, 'ME');
      expectClose(lenth?.sme, limits.SME, scale, 'SME');
    });

  it.each(Object.entries(computed.models ?? {}))('fits the model %s', (name, model) => {
    const logarithm = name.startsWith('ln y');
    const size = logarithm ? 1 : scale;
    const analysis = analyze(
      toAnalysisInput(example, {
        terms: model.terms,
        curvatureTerm: model.hasCurvatureTerm,
        blocks: model.blocksInModel,
        logarithm,
      }),
    );
    const close = (
      actual: number | null | undefined,
      wanted: number | null | undefined,
      what: string,
      order = 1,
    ) => {
      if (wanted === undefined) return;
      if (wanted === null) expect(actual ?? null, what).toBeNull();
      else expectClose(actual, wanted, size ** order, what);
    };
    close(analysis.intercept.coefficient, model.intercept.coefficient, 'intercept');
    close(analysis.intercept.se, model.intercept.se, 'intercept se');
    for (const term of model.terms) {
      const wanted = model.table[term];
      const found = find(analysis, term);
      close(found?.coefficient, wanted?.coefficient, term);
      close(found?.ss, wanted?.ss, `${term} ss`, 2);
      if (model.dfResidual === 0) continue;
      close(found && found.se !== null ? found.se / 2 : null, wanted?.se, `${term} se`);
      close(found?.t, wanted?.t, `${term} t`, 0);
      close(found?.p, wanted?.p, `${term} p`, 0);
      close(found?.ci?.[0], wanted?.ci95 && 2 * (wanted.ci95[0] ?? 0), `${term} ci`);
      close(found?.ci?.[1], wanted?.ci95 && 2 * (wanted.ci95[1] ?? 0), `${term} ci`);
    }
    for (const [source, wanted] of Object.entries(model.anova)) {
      const found = analysis.anova.find((row) => row.source === source);
      expect(found?.df, source).toBe(wanted.df);
      close(found?.ss, wanted.ss, `${source} ss`, 2);
      if (wanted.F !== undefined) close(found?.f, wanted.F, `${source} F`, 0);
      if (wanted.p !== undefined) close(found?.p, wanted.p, `${source} p`, 0);
    }
    if (model.hasCurvatureTerm) {
      const wanted = model.table['Curvature'];
      close(analysis.curvature?.estimate, wanted && -wanted.coefficient, 'curvature');
      close(analysis.curvature?.p, wanted?.p, 'curvature p', 0);
    }
    if (model.dfResidual > 0) close(analysis.error.sd, model.s, 's');
    close(analysis.r2, model.r2, 'r2', 0);
    if (model.dfResidual > 0) close(analysis.r2Adjusted, model.adjR2, 'adjusted r2', 0);
    close(analysis.press, model.press, 'press', 2);
    close(analysis.r2Predicted, model.predR2, 'predicted r2', 0);
    model.rows.forEach((row, index) => {
      close(analysis.fitted[index], row.fitted, `fitted ${index}`);
      close(analysis.residuals[index], row.residual, `residual ${index}`);
      close(analysis.leverage[index], row.leverage, `leverage ${index}`, 0);
      close(analysis.studentizedInternal[index], row.internallyStudentised, `internal ${index}`, 0);
      // With one residual degree of freedom the spread without the run is 0 / 0: rounding, for whoever divides.
      const external = model.dfResidual > 1 ? row.externallyStudentised : null;
      close(analysis.studentizedExternal[index], external, `external ${index}`, 0);
      close(analysis.cooks[index], row.cooks, `cook ${index}`, 0);
    });
    for (const wanted of model.predictions ?? []) {
      const x = (example.factors ?? []).map(({ letter }) => wanted.coded[letter] ?? Number.NaN);
      const found = predict(analysis, x);
      close(found.fit, wanted.fit, 'prediction');
      if (model.dfResidual === 0) continue;
      close(found.seFit, wanted.seFit, 'se of prediction');
      close(found.ci?.[0], wanted.ci95?.[0], 'ci of prediction');
      close(found.pi?.[1], wanted.pi95?.[1], 'pi of prediction');
    }
  });
});
