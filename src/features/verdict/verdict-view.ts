import type { BestBet, Brief, ConfirmationVerdict, Fact, Verdict } from '../../lib/doe/index.ts';
import type { CautionName, HazardName, StopRule } from '../trial/answer-choices.ts';
import type { TrialState } from '../trial/trial-states.ts';
import type { Decision } from './decision.ts';

/** A run as the verdict's pages show it. */
export interface ViewedRun {
  number: number;
  order: number;
  planned: (number | string)[];
  coded: number[];
  /** Result by result, the main one first: the parts of a measured result, or the count of a lot. */
  readings: number[][];
  end: string;
}

/** Everything the page of a verdict says, worked out and stored before; the page only words and draws it. */
export interface VerdictView {
  trialId: string;
  number: number;
  title: string;
  machine: string;
  madeAt: number;
  /** Which verdict of the trial this is, from 1. */
  n: number;
  state: TrialState;
  isLatest: boolean;
  brief: Brief;
  verdict: Verdict;
  bet: BestBet;
  /** What the check runs said; null before there were any. */
  confirmation: ConfirmationVerdict | null;
  /** Of the settings, in order, as the machine's panel shows them. */
  panelNames: string[];
  units: string[];
  /** Facts speak of runs by their place in this list. */
  runs: ViewedRun[];
  /** The settings to go back to. */
  usual: (number | string)[];
  hazards: { hazard: HazardName; cautions: CautionName[]; protects: string }[];
  stop: { picked: StopRule[]; own: string };
  call: { when: string; whom: string }[];
  partsFate: string | null;
  value: { partsPerWeek: number | null; costOfBadPart: number | null; currency: string };
  /** From the first run to the last reading; null where nobody knows. */
  hours: number | null;
  decisions: Decision[];
  mayDecide: boolean;
  /** Whether an engineer must agree first. */
  reviewDue: boolean;
  endedEarly: boolean;
  plannedRuns: number;
}

/** What may be shown while runs are out: readings, slow change and odd readings, but no effect and no ranking. */
export interface RunningView
  extends Pick<
    VerdictView,
    'trialId' | 'number' | 'title' | 'machine' | 'brief' | 'panelNames' | 'units' | 'runs' | 'plannedRuns'
  > {
  /** Of the facts only slow change and odd readings. */
  facts: Fact[];
}
