import { describe, expect, it } from 'vitest';
import { z } from 'zod';
import longley from '../../../../tests/fixtures/reference/open/strd-longley.json' with { type: 'json' };
import norris from '../../../../tests/fixtures/reference/open/strd-norris.json' with { type: 'json' };
import { factorModel } from './least-squares.ts';

// NIST Statistical Reference Datasets, linear regression: Norris (lower difficulty) and Longley (higher difficulty, condition number of the raw
// columns about 5e9). The certified values have 15 digits.
const runsSchema = z.array(z.record(z.string(), z.number()));

describe.each([
  { name: 'Norris', data: norris, predictors: ['x'] },
  { name: 'Longley', data: longley, predictors: ['x1', 'x2', 'x3', 'x4', 'x5', 'x6'] },
])('certified values of $name', ({ data, predictors }) => {
  const runs = runsSchema.parse(data.runs);
  const column = (name: string) => runs.map((run) => run[name] ?? Number.NaN);
  const model = factorModel([runs.map(() => 1), ...predictors.map(column)]);
  const fit = model.fit(column('y'));
  const sd = Math.sqrt(fit.residualSs / model.residualDf);
  const names = ['(Intercept)', ...predictors];
  const certified = new Map(data.published.map((entry) => [entry.quantity, entry.value]));
  const figures = new Map<string, number>([
    ['s', sd],
    ['ssResidual', fit.residualSs],
    ...names.flatMap((name, index): [string, number][] => [
      [`coefficients/${name}/estimate`, fit.coefficients[index] ?? Number.NaN],
      [`coefficients/${name}/se`, sd * Math.sqrt(model.variances[index] ?? Number.NaN)],
    ]),
  ]);

  it.each([...figures].filter(([quantity]) => certified.has(quantity)))('%s', (quantity, figure) => {
    const wanted = certified.get(quantity) ?? Number.NaN;
    expect(Math.abs(figure / wanted - 1)).toBeLessThan(1e-9);
  });

  it('covers every certified coefficient', () => {
    const wanted = [...certified.keys()].filter((quantity) => quantity.startsWith('coefficients/'));
    expect(wanted.length).toBeGreaterThan(3);
    expect(wanted.every((quantity) => figures.has(quantity))).toBe(true);
  });
});
