/** How far a run is. `asked`: somebody has it to make; `doubtful`: its reading is far from plausible and asked back. */
export const runStates = ['waiting', 'asked', 'made', 'done', 'doubtful', 'skipped'] as const;
export type RunState = (typeof runStates)[number];

/** How a run ended. `failed`: no part could be made; `beyondGauge`: the result is off the gauge. Both are readings of a kind. */
export const runEnds = ['measured', 'notRun', 'failed', 'beyondGauge'] as const;
export type RunEnd = (typeof runEnds)[number];

/** A number in its unit, or the name of a choice. */
export type SettingValue = number | string;

/** A run as the services know it. Moments are milliseconds UTC. */
export interface Run {
  id: string;
  trialId: string;
  planId: string;
  /** What it goes by on tags and in texts. */
  number: number;
  /** Its turn. */
  place: number;
  block: number;
  wholePlot: number | null;
  /** The same for runs with the same planned settings. */
  group: string;
  center: boolean;
  /** Made to warm the machine up; it does not count. */
  warmUp: boolean;
  coded: number[];
  planned: SettingValue[];
  /** What the dials were really set to, where that differs. */
  actual: SettingValue[] | null;
  state: RunState;
  end: RunEnd | null;
  /** Who makes it, and who measures it; null where that is decided when its turn comes. */
  personId: string | null;
  measurerId: string | null;
  gauge: string | null;
  label: string | null;
  stretchId: string | null;
  repeatsRunId: string | null;
  remindAt: number | null;
  askedAt: number | null;
  madeAt: number | null;
  measuredAt: number | null;
  closedAt: number | null;
  revision: number;
}

export function isOpen({ state }: Pick<Run, 'state'>): boolean {
  return state !== 'done' && state !== 'skipped';
}

export const readingStates = ['counts', 'asked back', 'not used', 'replaced'] as const;
export type ReadingState = (typeof readingStates)[number];

export const readingSources = ['text', 'phone page', 'board', 'paper', 'csv', 'import'] as const;
export type ReadingSource = (typeof readingSources)[number];

/** One figure of a run: a value, or rejects (flaws too: in `value`) out of a lot. */
export interface Figure {
  /** 0 is the main result, 1 to 3 those that are watched. */
  result: number;
  /** From 1. */
  part: number;
  value: number | null;
  rejects: number | null;
  lot: number | null;
}

export interface Reading extends Figure {
  id: string;
  runId: string;
  state: ReadingState;
  source: ReadingSource;
  inboxTextId: string | null;
  enteredBy: string | null;
  reason: string | null;
  replacesId: string | null;
  submission: string;
  createdAt: number;
}
