import { decideErrorPlan, isConstantWithin } from '../design/error-plan.ts';
import { sizeFamilies } from '../design/family-sizes.ts';
import type { ErrorPlan } from '../design/proposal.ts';
import { indicatorColumns } from '../linear-algebra/indicators.ts';
import type { LeastSquaresFit } from '../linear-algebra/least-squares.ts';
import type {
  Analysis,
  AnalysisInput,
  Curvature,
  ErrorEstimate,
  StratumError,
  TermEstimate,
} from './analysis.ts';
import { estimateCornerContrasts } from './corner-contrasts.ts';
import { diagnose } from './diagnostics.ts';
import { pureErrorOf } from './error-spread.ts';
import { type ErrorFindings, type ErrorQuestion, estimateError, negligibleSpread } from './estimate-error.ts';
import { computeLenthLimits } from './lenth.ts';
import { type MeasuredRun, selectMeasuredRuns } from './measured-runs.ts';
import { layOutModel, type ModelLayout } from './model-layout.ts';
import { spreadWithinRuns } from './spread-within-runs.ts';
import { listTerms } from './terms.ts';
import { tabulateVariance } from './variance-table.ts';
import { type Family, limitOf, testEstimate, type Yardstick } from './yardstick.ts';

/**
 * From readings to effects: least squares, the error they are judged by, tests and intervals, and the audit figures.
 *
 * Runs without a reading are left out. Effects are changes from low to high, twice the coefficient of the coded column.
 *
 * @throws AnalysisError when no run has a reading or a reading does not fit the scale
 * @throws RangeError when a setting or a term makes no sense
 */
export function analyze(input: AnalysisInput): Analysis {
  const alpha = input.alpha ?? 0.05;
  if (!(alpha > 0 && alpha < 1)) throw new RangeError(`analyze: alpha must be between 0 and 1, got ${alpha}`);
  const measured = selectMeasuredRuns(input);
  const { runs, layout } = measured;
  const y = runs.map((run) => run.y);
  const pairs = listTerms(layout.letters, 2);
  const hasMiddles = runs.some((run) => run.center) && runs.some((run) => !run.center);
  const model = layOutModel({
    layout,
    terms: input.terms ?? pairs,
    curvature: input.curvatureTerm ?? hasMiddles,
  });
  const withCurvature =
    model.hasCurvature || !hasMiddles ? model : layOutModel({ layout, terms: pairs, curvature: true });

  const decided = layout.remember('error plan', () => decideErrorPlan(layout.letters, layout.points));
  const plan = settlePlan(input.errorPlan, decided);
  const fit = model.model.fit(y);
  const pureError = pureErrorOf({ layout, y });
  const residual = { df: model.model.residualDf, ss: model.model.residualDf > 0 ? fit.residualSs : 0 };
  const stratumOf = stratumFinder(runs, input.error, plan);
  const familyOf = familyFinder(model, withCurvature, plan, stratumOf);
  const findings =
    input.error === 'residual'
      ? residualFindings(residual, familyOf(undefined), pureError)
      : estimateError({
          layout,
          y,
          terms: [...new Set([...pairs, ...model.terms])],
          plan,
          theory: measured.theory,
          familyOf,
        });

  const curvature = withCurvature.hasCurvature
    ? estimateCurvature(withCurvature, withCurvature === model ? fit : withCurvature.model.fit(y), {
        findings,
        stratumOf,
        alpha,
      })
    : undefined;
  const table = tabulateVariance({
    layout,
    model,
    y,
    residual,
    pureError,
    curvatureSs: model.hasCurvature ? (curvature?.ss ?? null) : null,
    error: meanSquareOf(findings.estimate),
  });
  const diagnostics = diagnose(model.model, fit, layout.weights, negligibleSpread({ y }));
  const contrasts = estimateCornerContrasts({ layout, y });
  const lenth = contrasts && computeLenthLimits(contrasts.effects, alpha);
  const within = spreadWithinRuns(measured.runs.flatMap(({ index }) => input.runs[index] ?? []));
  const predictable = table.totalSs > 0 ? diagnostics.press : null;
  const interceptYardstick = findings.yardstickFor(null, stratumOf(model.columns[0] ?? []));

  return {
    n: runs.length,
    used: runs.map((run) => run.index),
    scale: input.scale ?? 'raw',
    intercept: {
      term: 'intercept',
      effect: fit.coefficients[0] ?? 0,
      coefficient: fit.coefficients[0] ?? 0,
      ss: (fit.coefficients[0] ?? 0) ** 2 / (model.model.variances[0] ?? 1),
      aliasedWith: [],
      ...testEstimate(fit.coefficients[0] ?? 0, model.model.variances[0] ?? 0, interceptYardstick, alpha),
      pFamily: null,
    },
    terms: model.terms.map((term) => estimateTerm(term, model, fit, { findings, stratumOf, alpha })),
    aliases: model.aliases,
    confoundedWithBlocks: model.confoundedWithBlocks,
    notEstimable: input.terms === undefined ? [] : model.notEstimable,
    errorPlan: plan,
    error: findings.estimate,
    anova: table.rows,
    ...(within && input.scale !== 'freeman-tukey' && input.scale !== 'sqrt' && { within }),
    ...(curvature && { curvature }),
    ...(lenth && { lenth }),
    ...(table.lackOfFit && { lackOfFit: table.lackOfFit }),
    r2: table.r2,
    r2Adjusted: table.r2Adjusted,
    r2Predicted: predictable === null ? null : 1 - predictable / table.totalSs,
    press: diagnostics.press,
    fitted: fit.fitted,
    residuals: fit.residuals,
    leverage: [...model.model.leverage],
    studentizedInternal: diagnostics.studentizedInternal,
    studentizedExternal: diagnostics.studentizedExternal,
    cooks: diagnostics.cooks,
    basis: {
      letters: [...layout.letters],
      kinds: input.factors.map((factor) => factor.kind),
      blockColumns: model.blockColumns,
      hasCurvature: model.hasCurvature,
      covariance: layout.remember(`covariance of ${model.terms.join(' ')} ${model.hasCurvature}`, () =>
        model.model.covariance(),
      ),
      alpha,
      limit: interceptYardstick.kind === 'none' ? null : limitOf(interceptYardstick, alpha),
      wholePlotVariance: findings.wholePlotVariance,
    },
  };
}

interface TestContext {
  findings: ErrorFindings;
  stratumOf: (column: readonly number[]) => StratumError['name'] | undefined;
  alpha: number;
}

function estimateTerm(
  term: string,
  layout: ModelLayout,
  fit: LeastSquaresFit,
  context: TestContext,
): TermEstimate {
  const place = layout.columnOf(term);
  const column = layout.columns[place] ?? [];
  const coefficient = fit.coefficients[place] ?? 0;
  const variance = layout.model.variances[place] ?? 0;
  const stratum = context.stratumOf(column);
  const aliased = layout.aliases.find((alias) => alias.term === term)?.with ?? [];
  return {
    term,
    effect: 2 * coefficient,
    coefficient,
    ...testEstimate(
      2 * coefficient,
      4 * variance,
      context.findings.yardstickFor(column, stratum),
      context.alpha,
    ),
    ss: (coefficient * coefficient) / variance,
    aliasedWith: aliased.map((alias) => alias.term),
    ...(stratum && { stratum }),
  };
}

/** Corners minus middles: the coefficient of the indicator of middle runs with its sign changed. */
function estimateCurvature(layout: ModelLayout, fit: LeastSquaresFit, context: TestContext): Curvature {
  const place = layout.blockColumns + 1;
  const estimate = -(fit.coefficients[place] ?? 0);
  const variance = layout.model.variances[place] ?? 0;
  const stratum = context.stratumOf(layout.columns[place] ?? []);
  const tested = testEstimate(
    estimate,
    variance,
    context.findings.yardstickFor(null, stratum),
    context.alpha,
  );
  return { estimate, ...tested, ss: (estimate * estimate) / variance };
}

/** Which stratum a column is judged in; undefined without whole plots. */
function stratumFinder(
  runs: readonly MeasuredRun[],
  error: AnalysisInput['error'],
  { strata }: ErrorPlan,
): TestContext['stratumOf'] {
  if (strata === undefined || error === 'residual') return () => undefined;
  const plots = indicatorColumns(runs.map((run) => run.wholePlot));
  return (column) => (isConstantWithin(plots, column) ? 'whole' : 'sub');
}

/** Which effects are judged together, curvature among them. */
function familyFinder(
  model: ModelLayout,
  withCurvature: ModelLayout,
  plan: ErrorPlan,
  stratumOf: TestContext['stratumOf'],
): ErrorQuestion['familyOf'] {
  const places = model.terms.map((term) => stratumOf(model.columns[model.columnOf(term)] ?? []));
  const bend = withCurvature.hasCurvature
    ? [stratumOf(withCurvature.columns[withCurvature.blockColumns + 1] ?? [])]
    : [];
  const sizeOf = sizeFamilies([...places, ...bend], plan);
  return (stratum) => ({ ...sizeOf(stratum), hasCurvature: bend.includes(stratum) });
}

function residualFindings(
  residual: { df: number; ss: number },
  family: Family,
  pureError: { df: number; ss: number },
): ErrorFindings {
  const { df, ss } = residual;
  const sd = df > 0 ? Math.sqrt(ss / df) : null;
  const yardstick: Yardstick = sd === null ? { kind: 'none' } : { kind: 't', sd, df, family };
  return {
    estimate: { source: 'residual', df: df > 0 ? df : null, sd, ...(pureError.df > 0 && { pureError }) },
    yardstickFor: () => yardstick,
    wholePlotVariance: 0,
  };
}

function meanSquareOf({ sd, df, strata }: ErrorEstimate): { ms: number; df: number } | null {
  return sd === null || df === null || strata !== undefined ? null : { ms: sd * sd, df };
}

/** The plan fixed before the start holds as long as the runs that have readings still allow it. */
function settlePlan(fixed: ErrorPlan | undefined, decided: ErrorPlan): ErrorPlan {
  if (fixed === undefined) return decided;
  if (fixed.rung === decided.rung) return decided;
  const allowsRepeatsAlone = fixed.rung === 'replicates' && decided.replicateDf >= 3;
  return allowsRepeatsAlone
    ? { ...fixed, df: decided.replicateDf, replicateDf: decided.replicateDf }
    : decided;
}
