import type { FamilySize, JudgedIn } from './family-sizes.ts';
import type { Judging, MixedError } from './judging.ts';
import { judgeByDegrees, judgeByPseudoError } from './judging.ts';
import type { PlanningScale } from './planning-scale.ts';
import type { Detectable, ErrorPlan, ErrorStratum } from './proposal.ts';

export interface PromiseQuestion {
  scale: PlanningScale;
  errorPlan: ErrorPlan;
  /** How many effects are judged together in a stratum: tested terms, and curvature if there are middle runs. */
  familyOf: (stratum: JudgedIn) => FamilySize;
  /** Variance of the least well known main effect of an easy setting, for a run variance of 1; null when all settings are hard. */
  easyVariance: number | null;
  /** Absent when everything is shuffled freely. */
  hard?: HardSettings;
}

export interface HardSettings {
  /** Number of whole plots of corners, and of runs in one of them on average. */
  plots: number;
  runsEach: number;
  /** Degrees of freedom that whole plots of middles add to the error that hard settings are judged by, and runs in each. */
  middleDf: number;
  middleRunsEach: number;
  /** Variance of their least well known main effect over that in a balanced plan: 1 unless rules took corners away. */
  inflation: number;
}

export interface Promises {
  detectable: Detectable[];
  /** Of the least well seen kind of setting that can be judged; null: nothing can be said. */
  powerAtWorthHaving: number | null;
}

/** What a plan promises: sizes of change that it would find 8 times in 10, and how often it would find W. */
export function promise(question: PromiseQuestion): Promises {
  const { scale } = question;
  const seen = listKinds(question);
  const { worthHaving } = scale;
  return {
    detectable: seen.map(({ effect, judging, standardError }) => {
      const size = (sd: number, errors: number) => scale.toResponse(errors * standardError * sd);
      const [low, high] = scale.sdRange;
      return {
        size: size(1, judging.likelySize),
        unit: scale.unit,
        range: [size(low, judging.likelySize), size(high, judging.likelySize)],
        effect,
        clearSize: size(1, judging.clearSize),
        assumedActive: judging.assumedActive,
      };
    }),
    powerAtWorthHaving:
      worthHaving === null || seen.length === 0
        ? null
        : Math.min(...seen.map(({ judging, standardError }) => judging.power(worthHaving / standardError))),
  };
}

interface SeenKind {
  effect: Detectable['effect'];
  judging: Judging;
  standardError: number;
}

function listKinds({ scale, errorPlan, familyOf, easyVariance, hard }: PromiseQuestion): SeenKind[] {
  const stratum = (name: ErrorStratum['name']) =>
    errorPlan.strata?.find((candidate) => candidate.name === name);
  const kinds: SeenKind[] = [];
  const easy =
    hard === undefined ? judge(errorPlan, familyOf(undefined)) : judge(stratum('sub'), familyOf('sub'));
  if (easy !== null && easyVariance !== null) {
    kinds.push({ effect: 'easy', judging: easy, standardError: scale.runSd * Math.sqrt(easyVariance) });
  }
  const ofPlots = stratum('whole');
  if (hard !== undefined && ofPlots !== undefined) {
    const { variance, mixed } = mixPlots(scale, hard, ofPlots.df ?? 1);
    const whole = judge(ofPlots, familyOf('whole'), mixed);
    const standardError = Math.sqrt((4 / hard.plots) * hard.inflation * variance);
    if (whole !== null) kinds.push({ effect: 'hardToChange', judging: whole, standardError });
  }
  return kinds;
}

/**
 * Variance of the mean of a whole plot of corners, its own set-up and its share of runs, and the error that judges it. Plots of middles hold fewer
 * runs, so their means vary more: they make the error larger than the effect's own, and its degrees of freedom worth less.
 */
function mixPlots(
  { plotSd, runSd }: PlanningScale,
  hard: HardSettings,
  df: number,
): { variance: number; mixed: MixedError } {
  const varianceOf = (runs: number) => plotSd ** 2 + runSd ** 2 / runs;
  const variance = varianceOf(hard.runsEach);
  const middleDf = Math.min(df, hard.middleDf);
  const ratio = middleDf > 0 ? varianceOf(hard.middleRunsEach) / variance : 1;
  const sum = df - middleDf + middleDf * ratio;
  return {
    variance,
    mixed: { excess: sum / df, df: sum ** 2 / (df - middleDf + middleDf * ratio ** 2) },
  };
}

function judge(
  error: ErrorPlan | ErrorStratum | undefined,
  family: FamilySize,
  mixed?: MixedError,
): Judging | null {
  if (error === undefined || error.rung === 'none') return null;
  if (error.df !== null) return judgeByDegrees(error.df, family, mixed);
  return 'contrasts' in error ? judgeByPseudoError(error) : null;
}
