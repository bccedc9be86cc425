import type {
  Analysis,
  AnalysisInput,
  Brief,
  CheckComparison,
  ConfirmationVerdict,
  PlannedRun,
  PowerAtSize,
  Proposal,
  ResponseSpec,
  Transform,
} from '../../lib/doe/index.ts';
import type { TrialState } from '../trial/trial-states.ts';

/** What every page of an audit shows of its trial. */
export interface AuditFrameView {
  trialId: string;
  title: string;
  number: number;
  machine: string;
  state: TrialState;
  /** Main result first; empty without a plan. */
  results: { name: string; unit: string }[];
  hasPlan: boolean;
  /** Whether effects may be looked at: never while the runs are being made, so that nobody stops when it suits. */
  isJudged: boolean;
  hasCheckRuns: boolean;
  /** What somebody asked to have looked at, if anything. */
  waitsFor: 'plan' | 'verdict' | 'adoption' | null;
}

export interface AuditFactor {
  letter: string;
  name: string;
  unit: string;
}

export interface AuditPlanView {
  brief: Brief;
  proposal: Proposal;
  factors: AuditFactor[];
  n: number;
  seed: number;
  coreVersion: string;
  hash: string;
  /** Those of the trial proper, then those of the check. */
  runs: PlannedRun[];
  checks: { seed: number; runs: PlannedRun[] } | null;
  power: PowerAtSize[] | null;
}

/** One model of one result, with where it comes from. */
export interface AuditModelView {
  spec: ResponseSpec;
  result: number;
  factors: AuditFactor[];
  brief: Brief;
  input: AnalysisInput;
  analysis: Analysis;
  transform: Transform;
  /** Run numbers by place among the input's runs. */
  runNumbers: number[];
  /** Of an engineer's own model. */
  name: string | null;
  inputHash: string;
  /** The verdict that rests on these very readings; null: none yet, or a reading changed since. */
  verdict: {
    n: number;
    coreVersion: string;
    /** Whether what was stored then is what comes out now. */
    agrees: 'same' | 'otherCore' | 'differs';
  } | null;
}

export interface AuditCheckRun {
  number: number;
  place: number;
  isBest: boolean;
  /** Mean of its parts, or the count of its lot; null: no reading. */
  figure: number | null;
  settings: (number | string)[];
}

/** Check runs with the comparison they are judged by; null before both kinds have a reading. */
export interface AuditChecksView {
  spec: ResponseSpec;
  factors: AuditFactor[];
  comparison: CheckComparison | null;
  outcome: ConfirmationVerdict['outcome'] | null;
  runs: AuditCheckRun[];
}
