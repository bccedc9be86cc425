import type { Letter } from '../brief.ts';
import type { Alias, ErrorPlan, ErrorRung } from '../design/proposal.ts';

/** The scale on which effects are taken to add up. */
export type Scale = 'raw' | 'log' | 'sqrt' | 'freeman-tukey';

/** How a run ended; 'measured' if not given. Only measured runs are analyzed. */
export type RunEnd = 'measured' | 'notRun' | 'failed' | 'beyondGauge';

export interface AnalysisFactor {
  letter: Letter;
  kind: 'number' | 'choice';
}

export interface AnalysisRun {
  /** Coded settings as reached. With a `group`, settings less than 5 % of the half range off -1, 0 or 1 are analyzed as planned. */
  x: readonly number[];
  /** The planned combination. */
  group?: string;
  block?: number;
  wholePlot?: number;
  /** Middle run; if not given: all number settings at 0 and at least one number setting. */
  center?: boolean;
  /** Place in the run order. */
  order?: number;
  /** The run's figure: mean of its parts, count of rejects or flaws; null: none. */
  y: number | null;
  parts?: readonly number[];
  /** Parts inspected. */
  n?: number;
  end?: RunEnd;
}

export interface AnalysisInput {
  factors: readonly AnalysisFactor[];
  runs: readonly AnalysisRun[];
  /** Default: every estimable term of one or two letters. */
  terms?: readonly string[];
  /** Indicator of middle runs in the model; default: when there are middle runs. */
  curvatureTerm?: boolean;
  scale?: Scale;
  /** 'residual': the ordinary residual mean square of the model, as any regression program. */
  error?: 'ladder' | 'residual';
  /** As fixed before the start; if not given it is decided from the runs that have readings. */
  errorPlan?: ErrorPlan;
  /** 0.05 if not given. */
  alpha?: number;
  /** Variance of a run's figure by theory, where there is one beside that of counts: a floor for the error. */
  knownVariance?: number;
}

/** An estimate against its error. All but the estimate are null where there is no error to judge it by. */
export interface Tested {
  se: number | null;
  /** null also for pseudo error and for a known variance. */
  df: number | null;
  t: number | null;
  p: number | null;
  /** Judged together with all other effects of this result. */
  pFamily: number | null;
  ci: [number, number] | null;
}

export interface TermEstimate extends Tested {
  term: string;
  /** Change of the result from low to high: twice the coefficient. For the intercept the coefficient itself. */
  effect: number;
  /** Of the coded column. */
  coefficient: number;
  /** Sum of squares of this term when it enters last. */
  ss: number;
  aliasedWith: string[];
  stratum?: 'whole' | 'sub';
}

export type ErrorSource = ErrorRung | 'known' | 'residual';

export interface StratumError {
  name: 'whole' | 'sub';
  source: ErrorSource;
  df: number | null;
  /** Of one run, as it enters the estimates of this stratum; null: no error. */
  sd: number | null;
}

export interface ErrorEstimate {
  source: ErrorSource;
  df: number | null;
  /** Run-to-run standard deviation. */
  sd: number | null;
  pureError?: { df: number; ss: number };
  strata?: StratumError[];
}

export interface AnovaRow {
  source: 'blocks' | 'model' | 'curvature' | 'residual' | 'lackOfFit' | 'pureError' | 'total';
  df: number;
  ss: number;
  ms: number | null;
  f: number | null;
  p: number | null;
}

export interface Curvature {
  /** Mean of the corner runs minus mean of the middle runs. */
  estimate: number;
  se: number | null;
  ci: [number, number] | null;
  ss: number;
  t: number | null;
  df: number | null;
  p: number | null;
  pFamily: number | null;
}

export interface LenthLimits {
  s0: number;
  pse: number;
  /** Degrees of freedom, a third of the contrasts. */
  d: number;
  /** Margin of error of one effect. */
  me: number;
  /** Margin of error of all effects together. */
  sme: number;
}

/** What predictions need beyond the estimates; plain numbers, so that a stored analysis can still predict. */
export interface PredictionBasis {
  letters: Letter[];
  kinds: ('number' | 'choice')[];
  blockColumns: number;
  hasCurvature: boolean;
  /** Of the coefficients in the order intercept, blocks, curvature, terms, for error variance 1. */
  covariance: number[][];
  alpha: number;
  /** Half-width of an interval in standard errors; null without error. */
  limit: number | null;
  /** Spread of a run on top of that of the sub stratum; 0 without whole plots. */
  wholePlotVariance: number;
}

export interface Analysis {
  /** Readings analyzed. */
  n: number;
  /** Their places among the input's runs: fitted values and all that follows go by these. */
  used: number[];
  scale: Scale;
  intercept: TermEstimate;
  terms: TermEstimate[];
  aliases: Alias[];
  confoundedWithBlocks: string[];
  /** Terms asked for that these runs cannot separate from terms before them. */
  notEstimable: string[];
  errorPlan: ErrorPlan;
  error: ErrorEstimate;
  anova: AnovaRow[];
  /** Spread between parts of one run; `parts` is their (harmonic) mean number. */
  within?: { sd: number; df: number; parts: number };
  curvature?: Curvature;
  lenth?: LenthLimits;
  lackOfFit?: { df: number; ss: number; f: number; p: number };
  r2: number;
  r2Adjusted: number;
  r2Predicted: number | null;
  press: number | null;
  fitted: number[];
  residuals: number[];
  leverage: number[];
  /** null where leverage is 1 or there is no residual spread. */
  studentizedInternal: (number | null)[];
  studentizedExternal: (number | null)[];
  cooks: (number | null)[];
  basis: PredictionBasis;
}

export type AnalysisErrorCode =
  /** No run has a reading. */
  | 'no-readings'
  /** A logarithm of zero or less, a root of less than zero, more rejects than parts. */
  | 'reading-outside-scale'
  /** A reading is no finite number. */
  | 'not-a-number';

/** Readings that cannot be analyzed at all; `runs` are their places among the input's runs. */
export class AnalysisError extends Error {
  override readonly name = 'AnalysisError';
  readonly code: AnalysisErrorCode;
  readonly runs: readonly number[];

  constructor(code: AnalysisErrorCode, runs: readonly number[] = []) {
    super(`${code}${runs.length > 0 ? ` at runs ${runs.join(', ')}` : ''}`);
    this.code = code;
    this.runs = runs;
  }
}
