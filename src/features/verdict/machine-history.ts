import type { TrialState } from '../trial/trial-states.ts';
import type { DecisionOutcome } from './decision.ts';

export interface MachineTrial {
  id: string;
  number: number;
  title: string;
  state: TrialState;
  /** What was decided last; null: nothing yet. */
  outcome: DecisionOutcome | null;
  at: number;
}

export interface MachineHistory {
  /** The settings that were taken over last and are used now; null: none of a trial's. */
  inUse: {
    trialId: string;
    number: number;
    since: number;
    /** Taken over without check runs that held. */
    unchecked: boolean;
    settings: { name: string; value: number | string; unit: string }[];
  } | null;
  /** Newest first. */
  trials: MachineTrial[];
}

/** The page of a machine's trials. */
export function machineAddress(machine: string): string {
  return `/trials/machine?name=${encodeURIComponent(machine)}`;
}
