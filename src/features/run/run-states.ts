import { type RunState, runStates } from './run.ts';

export const runEvents = [
  'ask',
  'open',
  'make',
  'record part',
  'record',
  'doubt',
  'confirm',
  'deny',
  'second reading',
  'skip',
  'put back',
  'hand over',
  'take back',
  'correct',
  'repeat',
  'set actual',
  'note',
  'send now',
] as const;
export type RunEvent = (typeof runEvents)[number];

/**
 * Who makes it happen: the permission that a person needs (`run.record.own`: whoever has that run), or the product itself.
 */
export type RunActor = 'run.record' | 'reading.correct' | 'run.record.own' | 'product';

export interface RunStep {
  from: RunState;
  event: RunEvent;
  by: readonly RunActor[];
  to: RunState;
}

const supervisor = ['run.record'] as const;
const crew = ['run.record', 'run.record.own'] as const;

/** Before a reading is all in: made at the machine, then measured, by the same or another person. */
const makingSteps: readonly RunStep[] = [
  { from: 'waiting', event: 'ask', by: ['product'], to: 'asked' },
  { from: 'waiting', event: 'open', by: ['run.record.own'], to: 'asked' },
  { from: 'waiting', event: 'send now', by: supervisor, to: 'waiting' },
  { from: 'waiting', event: 'make', by: crew, to: 'made' },
  { from: 'waiting', event: 'record part', by: crew, to: 'made' },
  // From the board, from paper or from a file, and from a text that came after a stop.
  { from: 'waiting', event: 'record', by: crew, to: 'done' },
  { from: 'waiting', event: 'doubt', by: ['product'], to: 'doubtful' },
  { from: 'waiting', event: 'hand over', by: supervisor, to: 'waiting' },
  { from: 'asked', event: 'make', by: crew, to: 'made' },
  { from: 'asked', event: 'record part', by: crew, to: 'asked' },
  { from: 'asked', event: 'record', by: crew, to: 'done' },
  { from: 'asked', event: 'doubt', by: ['product'], to: 'doubtful' },
  { from: 'asked', event: 'hand over', by: supervisor, to: 'waiting' },
  // A trial that is held takes back what nobody has made yet.
  { from: 'asked', event: 'take back', by: ['product'], to: 'waiting' },
  { from: 'made', event: 'record part', by: crew, to: 'made' },
  { from: 'made', event: 'record', by: crew, to: 'done' },
  { from: 'made', event: 'doubt', by: ['product'], to: 'doubtful' },
  { from: 'made', event: 'hand over', by: supervisor, to: 'made' },
];

const readingSteps: readonly RunStep[] = [
  { from: 'doubtful', event: 'confirm', by: crew, to: 'done' },
  { from: 'doubtful', event: 'deny', by: crew, to: 'made' },
  { from: 'doubtful', event: 'record part', by: crew, to: 'made' },
  // Another value counts at once: nobody is asked twice.
  { from: 'doubtful', event: 'record', by: crew, to: 'done' },
  { from: 'done', event: 'second reading', by: ['product'], to: 'done' },
  { from: 'done', event: 'correct', by: ['reading.correct', 'run.record.own'], to: 'done' },
  { from: 'done', event: 'repeat', by: supervisor, to: 'done' },
  { from: 'skipped', event: 'repeat', by: supervisor, to: 'skipped' },
  { from: 'skipped', event: 'put back', by: supervisor, to: 'waiting' },
];

const openStates = ['waiting', 'asked', 'made', 'doubtful'] as const;

/** Every step that a run can take. What is not here is refused with `not-now`; services, buttons and tests read it alike. */
export const runSteps: readonly RunStep[] = [
  ...makingSteps,
  ...readingSteps,
  ...openStates.map((from): RunStep => ({ from, event: 'skip', by: crew, to: 'skipped' })),
  ...runStates.flatMap((from): RunStep[] => [
    { from, event: 'note', by: crew, to: from },
    ...(from === 'skipped' ? [] : [{ from, event: 'set actual' as const, by: supervisor, to: from }]),
  ]),
];

/** What an event does to a run in that state; undefined: nothing, it is refused. */
export function runStepOf(from: RunState, event: RunEvent): RunStep | undefined {
  return runSteps.find((step) => step.from === from && step.event === event);
}

/** The states from which an event leads anywhere. */
export function statesBefore(event: RunEvent): RunState[] {
  return runSteps.filter((step) => step.event === event).map(({ from }) => from);
}

/** What whoever may do this much can do with a run in that state, for buttons. */
export function runEventsOpenTo(from: RunState, may: (permission: RunActor) => boolean): RunEvent[] {
  return runSteps.filter((step) => step.from === from && step.by.some(may)).map(({ event }) => event);
}
