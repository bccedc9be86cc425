// The only door into the statistics core: the rest of the product imports from here and from nowhere deeper.
export * from './brief.ts';
export { PlanError, type PlanErrorCode } from './design/plan-error.ts';
export type {
  Alias,
  Detectable,
  ErrorPlan,
  ErrorRung,
  ErrorStratum,
  PlannedRun,
  Proposal,
} from './design/proposal.ts';
export * from './distributions/index.ts';
export * from './facts.ts';
