import { describe, expect, it } from 'vitest';
import {
  type Example,
  factorialExamples,
  toAnalysisInput,
} from '../../../../tests/builders/reference-examples.ts';
import type { Analysis } from './analysis.ts';
import { analyze } from './analyze.ts';

/** Figures of a source that are no figure of ours: worked steps of a hand calculation. */
const HAND_CALCULATION = /^(resSd|grandSd|tA|seEffect|confoundedContrasts|boxcox|curvature\/mean)/;

/** The figure of ours that a path such as 'effects/AB' or 'models/A,B/anova/model/F' names. */
function figureOf(example: Example, path: string): number | null | undefined {
  const [area, ...rest] = path.split('/');
  const blocks = new Set(example.runs.map((run) => run.block)).size > 1;
  if (area !== 'models') {
    const terms = Object.keys(example.computed.effects ?? {});
    const analysis = analyze(toAnalysisInput(example, { terms, curvatureTerm: false, blocks }));
    return wholeFigure(analysis, area, rest[0] ?? '');
  }
  const name = rest[0] ?? '';
  const model = example.computed.models?.[name];
  const analysis = analyze(
    toAnalysisInput(example, {
      terms: model?.terms ?? [],
      curvatureTerm: model?.hasCurvatureTerm ?? false,
      blocks: model?.blocksInModel ?? false,
      logarithm: name.startsWith('ln y'),
    }),
  );
  return modelFigure(analysis, rest.slice(1));
}

function wholeFigure(analysis: Analysis, area: string | undefined, name: string): number | null | undefined {
  const term = analysis.terms.find((entry) => entry.term === name);
  if (area === 'effects') return term?.effect;
  if (area === 'ss') return term?.ss;
  if (area === 'mean') return analysis.intercept.coefficient;
  if (area === 'total') return analysis.anova.find((row) => row.source === 'total')?.ss;
  if (area === 'lenth' && name === 'PSE') return analysis.lenth?.pse;
  if (area === 'curvature' && name === 'difference') return analysis.curvature?.estimate;
  if (area === 'curvature' && name === 'ss') return analysis.curvature?.ss;
  if (area === 'curvature' && name === 'pureErrorMs') {
    const pure = analysis.error.pureError;
    return pure && pure.ss / pure.df;
  }
  return undefined;
}

function modelFigure(analysis: Analysis, path: string[]): number | null | undefined {
  const [area, name = '', figure = ''] = path;
  if (area === 'table') return termFigure(analysis, name, figure);
  if (area === 'intercept')
    return {
      coefficient: analysis.intercept.coefficient,
      se: analysis.intercept.se,
      t: analysis.intercept.t,
    }[name];
  if (area === 'anova') {
    const row = analysis.anova.find((entry) => entry.source === name);
    return { df: row?.df, ss: row?.ss, ms: row?.ms, F: row?.f, p: row?.p }[figure];
  }
  return {
    r2: analysis.r2,
    adjR2: analysis.r2Adjusted,
    predR2: analysis.r2Predicted,
    press: analysis.press,
    s: analysis.error.sd,
  }[area ?? ''];
}

function termFigure(analysis: Analysis, name: string, figure: string): number | null | undefined {
  if (name === 'Curvature') {
    const bend = analysis.curvature;
    return { F: (bend?.t ?? Number.NaN) ** 2, p: bend?.p, ss: bend?.ss, coefficient: bend && -bend.estimate }[
      figure
    ];
  }
  const term = analysis.terms.find((entry) => entry.term === name);
  const squared = term?.t === null || term === undefined ? undefined : term.t ** 2;
  const se = term?.se == null ? undefined : term.se / 2;
  return { coefficient: term?.coefficient, ss: term?.ss, F: squared, t: term?.t, p: term?.p, se }[figure];
}

/** Half a unit of the last printed digit, and a little for decimal fractions that a double cannot hold. */
function halfLastDigit(printed: string): number {
  const [mantissa = '', exponent = '0'] = printed
    .replace(/[^0-9.eE+-]/g, '')
    .toLowerCase()
    .split('e');
  const decimals = mantissa.includes('.') ? mantissa.length - mantissa.indexOf('.') - 1 : 0;
  return 0.5 * 10 ** (Number(exponent) - decimals) * (1 + 1e-6);
}

const cases = factorialExamples.flatMap((example) =>
  example.published
    .filter((entry) => entry.agrees && !HAND_CALCULATION.test(entry.quantity))
    .map((entry) => ({ example, ...entry })),
);

describe('digits that the sources print', () => {
  it.each(cases)('$example.id: $quantity is $printed', ({ example, quantity, printed, value }) => {
    const figure = figureOf(example, quantity);
    expect(typeof figure, quantity).toBe('number');
    expect(Math.abs((figure ?? Number.NaN) - value)).toBeLessThanOrEqual(halfLastDigit(printed));
  });
});
