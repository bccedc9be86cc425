import type { ErrorPlan, ErrorRung } from '../design/proposal.ts';
import { hasPseudoErrorLimits } from '../tables/pseudo-error-limits.ts';
import type { ErrorEstimate, ErrorSource, StratumError } from './analysis.ts';
import { type CornerContrasts, estimateCornerContrasts } from './corner-contrasts.ts';
import {
  leftoverBetweenPlots,
  leftoverSpread,
  pureErrorOf,
  type Spread,
  type SpreadQuestion,
} from './error-spread.ts';
import { estimatePseudoErrors } from './pseudo-error.ts';
import type { Family, Yardstick } from './yardstick.ts';

/** What the readings say about error, and what each estimate is to be held against. */
export interface ErrorFindings {
  estimate: ErrorEstimate;
  /** For a term with this column, or for `null`: what is no contrast (intercept, curvature, predictions). */
  yardstickFor(column: readonly number[] | null, stratum?: StratumError['name']): Yardstick;
  /** Spread of a run on top of the spread within whole plots. */
  wholePlotVariance: number;
}

export interface ErrorQuestion extends SpreadQuestion {
  plan: ErrorPlan;
  /** Variance of a run by theory (rejects, flaws): a floor. */
  theory: number | null;
  /** Effects judged together: all, or those of one stratum. */
  familyOf(stratum: StratumError['name'] | undefined): Family;
}

/** Error by the ladder; the rung comes from the plan, the spread from the readings. */
export function estimateError(question: ErrorQuestion): ErrorFindings {
  const pureError = pureErrorOf(question);
  const withPure = pureError.df > 0 ? { pureError } : {};
  const { plan } = question;
  const plots = plan.strata;
  if (plots === undefined) {
    const rung = climb({
      question,
      rung: plan.rung,
      family: question.familyOf(undefined),
      pureError,
      leftover: leftoverSpread(question),
      contrasts: () => estimateCornerContrasts(question),
    });
    return {
      estimate: { source: rung.source, df: rung.df, sd: rung.sd, ...withPure },
      yardstickFor: rung.yardstickFor,
      wholePlotVariance: 0,
    };
  }

  const rungOf = (name: StratumError['name']) => plots.find((plot) => plot.name === name)?.rung ?? 'none';
  const sub = climb({
    question,
    rung: rungOf('sub'),
    family: question.familyOf('sub'),
    pureError: pureErrorOf(question, 'wholePlot'),
    leftover: leftoverSpread(question, 'wholePlot'),
    contrasts: () => estimateCornerContrasts(question, 'wholePlot'),
  });
  const between = leftoverBetweenPlots(question);
  const whole = climb({
    question,
    rung: rungOf('whole'),
    family: question.familyOf('whole'),
    pureError: between,
    leftover: between,
    contrasts: () => null,
  });
  const plotCount = new Set(question.layout.points.map((point) => point.wholePlot)).size;
  const wholePlotVariance =
    sub.sd === null || whole.sd === null
      ? 0
      : Math.max(0, (whole.sd ** 2 - sub.sd ** 2) / (question.y.length / plotCount));
  const strata: StratumError[] = [
    { name: 'whole', source: whole.source, df: whole.df, sd: whole.sd },
    { name: 'sub', source: sub.source, df: sub.df, sd: sub.sd },
  ];
  return {
    estimate: {
      source: sub.source,
      df: sub.df,
      sd: sub.sd === null ? null : Math.sqrt(sub.sd ** 2 + wholePlotVariance),
      ...withPure,
      strata,
    },
    yardstickFor: (column, stratum) => (stratum === 'whole' ? whole : sub).yardstickFor(column),
    wholePlotVariance,
  };
}

interface Rung {
  source: ErrorSource;
  df: number | null;
  sd: number | null;
  yardstickFor(column: readonly number[] | null): Yardstick;
}

function climb(step: {
  question: ErrorQuestion;
  rung: ErrorRung;
  family: Family;
  pureError: Spread;
  leftover: Spread;
  contrasts: () => CornerContrasts | null;
}): Rung {
  const { question, rung, family, pureError, leftover } = step;
  const floor = Math.sqrt(question.theory ?? 0);
  const negligible = negligibleSpread(question);
  const lifted = (sd: number) => Math.max(floor, sd <= negligible ? 0 : sd);

  if (rung === 'replicates' || rung === 'replicates+high-order') {
    const { df, ss } = rung === 'replicates' && pureError.df > 0 ? pureError : leftover;
    if (df > 0) {
      const sd = lifted(Math.sqrt(ss / df));
      return {
        source: rung,
        df,
        sd,
        yardstickFor: () => ({ kind: 't', sd, df, family }),
      };
    }
  }
  if (rung === 'pseudo' || rung === 'pseudo+replicates') {
    const contrasts = step.contrasts();
    // Middle runs in every block make a contrast that blocks hide estimable, but never as well as the others: it is no yardstick, and six are too few.
    if (contrasts !== null && hasLimits(contrasts, pureError))
      return pseudoRung({ rung, family, pureError, contrasts, lifted });
  }
  if (question.theory !== null && floor > 0)
    return { source: 'known', df: null, sd: floor, yardstickFor: () => ({ kind: 'known', sd: floor }) };
  return { source: 'none', df: null, sd: null, yardstickFor: () => ({ kind: 'none' }) };
}

function hasLimits({ effects }: CornerContrasts, { df }: Spread): boolean {
  return hasPseudoErrorLimits({ contrasts: effects.length, replicateDf: df });
}

function pseudoRung(step: {
  rung: ErrorRung;
  family: Family;
  pureError: Spread;
  contrasts: CornerContrasts;
  lifted: (sd: number) => number;
}): Rung {
  const { rung, family, pureError, contrasts, lifted } = step;
  // An effect is the difference of two means of half the corners, so its error is 2 / sqrt(corners) of a run's.
  const toRun = Math.sqrt(contrasts.runs) / 2;
  const errors = estimatePseudoErrors({
    contrasts: contrasts.effects,
    replicateError: pureError.df === 0 ? 0 : Math.sqrt(pureError.ss / pureError.df) / toRun,
    replicateDf: pureError.df,
  });
  const plan = { contrasts: contrasts.effects.length, replicateDf: pureError.df };
  const overall = lifted(errors.overall * toRun);
  return {
    source: rung,
    df: null,
    sd: overall,
    yardstickFor(column) {
      const place = column === null ? -1 : contrasts.placeOf(column);
      const leftOut = errors.leaveOneOut[place];
      if (leftOut === undefined) return { kind: 'pseudo', sd: overall, plan, outside: true, family };
      return { kind: 'pseudo', sd: lifted(leftOut * toRun), plan, outside: false, family };
    },
  };
}

/** Spread that is rounding and no spread: readings carry about sixteen digits. */
export function negligibleSpread({ y }: { y: readonly number[] }): number {
  return 32 * Number.EPSILON * Math.max(...y.map(Math.abs));
}
