// The only door into the statistics core: the rest of the product imports from here and from nowhere deeper.
export { type AdviceFact, isAdviceFact } from './advice/advice-facts.ts';
export { bestBet } from './advice/best-bet.ts';
export { type CheckRunReading, readCheckRuns } from './advice/check-readings.ts';
export { type CheckRuns, planCheckRuns } from './advice/check-runs.ts';
export { judge } from './advice/judge.ts';
export {
  type CheckComparison,
  type CheckReadings,
  compareCheckRuns,
  judgeConfirmation,
} from './advice/judge-confirmation.ts';
export { checkGroups, layOutCheckRuns } from './advice/lay-out-check-runs.ts';
export { type Look, lookAtSettings } from './advice/look-at-settings.ts';
export type { ResultInput } from './advice/result-model.ts';
export { settingsToTry } from './advice/settings-to-try.ts';
export { usualValues } from './advice/usual-settings.ts';
export {
  type BestBet,
  bestBetSchema,
  type ConfirmationVerdict,
  confirmationVerdictSchema,
  type Outlook,
  type Verdict,
  verdictSchema,
} from './advice/verdict.ts';
export { type Alternative, type AlternativeWish, analyzeAlternative } from './analysis/alternative.ts';
export type * from './analysis/analysis.ts';
export { AnalysisError } from './analysis/analysis.ts';
export { analyze } from './analysis/analyze.ts';
export { type BoxCox, fitBoxCox } from './analysis/box-cox.ts';
export { checkGauge, type GaugeCheck } from './analysis/check-gauge.ts';
export { type Drift, estimateDrift } from './analysis/drift.ts';
export { type EffectPlot, type PlottedEffect, plotEffects } from './analysis/effect-plot.ts';
export { meanOfParts } from './analysis/mean-of-parts.ts';
export { halfNormalScores, normalScores, type PlottingPosition } from './analysis/plot-scores.ts';
export { type Prediction, predict } from './analysis/predict.ts';
export { predictInUnit, type UnitPrediction } from './analysis/predict-in-unit.ts';
export { listRunChecks, type RunCheck } from './analysis/run-checks.ts';
export { analyzeSteadiness } from './analysis/steadiness.ts';
export { listTermVariances, type TermVariance } from './analysis/term-variance.ts';
export { compareTerms, completeHierarchy, listTerms } from './analysis/terms.ts';
export { figureBehind, type Transform, transformFigure } from './analysis/transforms.ts';
export * from './brief.ts';
export { coach } from './design/coach.ts';
export { describePast, type PastNumbers, spreadOfExtremes } from './design/describe-past.ts';
export { decode, encode } from './design/dial.ts';
export type { CoachDraft, DraftFactor } from './design/draft.ts';
export { countForbidden, isForbidden } from './design/forbidden.ts';
export { type HardRun, hardestRuns } from './design/hardest-runs.ts';
export { layOutAddedRuns, layOutRuns } from './design/lay-out-runs.ts';
export { moveWindow } from './design/move-window.ts';
export { listNextPlans, type NextPlan, type NextWish } from './design/next-plans.ts';
export { PlanError, type PlanErrorCode } from './design/plan-error.ts';
export { type PowerAtSize, powerCurve } from './design/power-curve.ts';
export type {
  Alias,
  Detectable,
  ErrorPlan,
  ErrorRung,
  ErrorStratum,
  LayoutRow,
  PlannedRun,
  Proposal,
} from './design/proposal.ts';
export { errorPlanSchema, proposalSchema } from './design/proposal-schema.ts';
export { proposePlans } from './design/propose-plans.ts';
export { suggestWorthHaving } from './design/suggest-worth-having.ts';
export { countTimeAndMoney } from './design/time-and-money.ts';
export { letterAt } from './design/words.ts';
export * from './distributions/index.ts';
export * from './facts.ts';
export { type FigureName, type FigureSource, figureSources } from './figure-sources.ts';
export { listPseudoErrorTails } from './tables/pseudo-error-limits.ts';
export { coreVersion } from './version.ts';
