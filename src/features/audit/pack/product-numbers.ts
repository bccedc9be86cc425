import { type Analysis, type Prediction, predict, type TermEstimate } from '../../../lib/doe/index.ts';

/** One number of the product under the name that the recomputation gives it too. */
export type ProductNumber = [part: string, item: string | number, statistic: string, value: number];

type Loose = [part: string, item: string | number, statistic: string, value: number | null | undefined];

function known(numbers: readonly Loose[]): ProductNumber[] {
  return numbers.flatMap(([part, item, statistic, value]): ProductNumber[] =>
    value === null || value === undefined ? [] : [[part, item, statistic, value]],
  );
}

type Tested = Pick<TermEstimate, 'se' | 'df' | 't' | 'p' | 'pFamily' | 'ci'>;

function listTest(part: string, item: string, { se, df, t, p, pFamily, ci }: Tested): Loose[] {
  return [
    [part, item, 'se', se],
    [part, item, 'df', df],
    [part, item, 't', t],
    [part, item, 'p', p],
    [part, item, 'pFamily', pFamily],
    [part, item, 'low', ci?.[0]],
    [part, item, 'high', ci?.[1]],
  ];
}

function listEffect(estimate: TermEstimate): Loose[] {
  const { term, effect, ss } = estimate;
  return [
    ['effect', term, 'effect', effect],
    ['effect', term, 'ss', ss],
    ...listTest('effect', term, estimate),
  ];
}

function listError({ error, basis, within, lenth }: Analysis): Loose[] {
  return [
    ['error', 'run', 'sd', error.sd],
    ['error', 'run', 'df', error.df],
    ['error', 'pure', 'df', error.pureError?.df],
    ['error', 'pure', 'ss', error.pureError?.ss],
    ['error', 'whole', 'variance', error.strata ? basis.wholePlotVariance : null],
    ...(error.strata ?? []).flatMap(({ name, df, sd }): Loose[] => [
      ['error', name, 'df', df],
      ['error', name, 'sd', sd],
    ]),
    ['within', 'sd', 'value', within?.sd],
    ['within', 'df', 'value', within?.df],
    ['within', 'parts', 'value', within?.parts],
    ...(['s0', 'pse', 'd', 'me', 'sme'] as const).map(
      (name): Loose => ['lenth', name, 'value', lenth?.[name]],
    ),
  ];
}

function listRuns(analysis: Analysis, runNumbers: readonly number[]): Loose[] {
  return analysis.used.flatMap((place, index): Loose[] => {
    const run = runNumbers[place] ?? place;
    return [
      ['run', run, 'fitted', analysis.fitted[index]],
      ['run', run, 'residual', analysis.residuals[index]],
      ['run', run, 'leverage', analysis.leverage[index]],
      ['run', run, 'studentizedInternal', analysis.studentizedInternal[index]],
      ['run', run, 'studentizedExternal', analysis.studentizedExternal[index]],
      ['run', run, 'cook', analysis.cooks[index]],
    ];
  });
}

/** A point at which the recomputation predicts, in coded units. */
export interface PackPoint {
  name: string;
  coded: readonly number[];
}

function listPrediction(name: string, { fit, seFit, ci, pi, piPart, bendRange }: Prediction): Loose[] {
  const ranges = { ci, pi, part: piPart, bend: bendRange };
  return [
    ['prediction', name, 'fit', fit],
    ['prediction', name, 'se', seFit],
    ...Object.entries(ranges).flatMap(([kind, range]): Loose[] => [
      ['prediction', name, `${kind}Low`, range?.[0]],
      ['prediction', name, `${kind}High`, range?.[1]],
    ]),
  ];
}

/**
 * All numbers of a stored analysis that are worked out anew.
 * @param runNumbers of the runs that went into it, in their order
 */
export function listProductNumbers(
  analysis: Analysis,
  about: { runNumbers: readonly number[]; points: readonly PackPoint[] },
): ProductNumber[] {
  const { curvature, anova, r2, r2Adjusted, r2Predicted, press } = analysis;
  return known([
    ...[analysis.intercept, ...analysis.terms].flatMap(listEffect),
    ['curvature', 'curvature', 'estimate', curvature?.estimate],
    ['curvature', 'curvature', 'ss', curvature?.ss],
    ...(curvature ? listTest('curvature', 'curvature', curvature) : []),
    ...anova.flatMap(({ source, ...row }) =>
      (['df', 'ss', 'ms', 'f', 'p'] as const).map((name): Loose => ['anova', source, name, row[name]]),
    ),
    ...listError(analysis),
    ...Object.entries({ r2, r2Adjusted, r2Predicted, press }).map(
      ([name, value]): Loose => ['fit', name, 'value', value],
    ),
    ...listRuns(analysis, about.runNumbers),
    ...about.points.flatMap(({ name, coded }) => listPrediction(name, predict(analysis, coded))),
  ]);
}
