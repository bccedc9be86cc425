/** Where a trial stands. A draft that is deleted is gone, so that is no state. */
export const trialStates = [
  'draft',
  'plan review',
  'ready',
  'running',
  'paused',
  'held',
  'readings in',
  'verdict review',
  'deciding',
  'adoption review',
  'closed',
] as const;
export type TrialState = (typeof trialStates)[number];

export const trialEvents = [
  'send for review',
  'approve',
  'send back',
  'take back',
  'change an answer',
  'start',
  'delete',
  'pause',
  'hold',
  'resume',
  'last run closed',
  'judge',
  'verdict made',
  'repeat a run',
  'put back a run',
  'reading corrected',
  'plan check runs',
  'adopt',
  'not now',
  'open again',
] as const;
export type TrialEvent = (typeof trialEvents)[number];

/**
 * Who makes it happen: the permission that a person needs (`trial.hold`: anybody in the trial), being the shop's safety
 * person, or the product itself.
 */
export type TrialActor =
  | 'trial.write'
  | 'trial.run'
  | 'decide'
  | 'review.decide'
  | 'trial.hold'
  | 'safety person'
  | 'product';

/** What must hold besides the state. Each is checked where the event is carried out. */
export type TrialCondition =
  | 'complete, plan chosen'
  | 'no plan review due'
  | 'as approved'
  | 'not the one who asked'
  | 'with a reason after held'
  | 'no review due'
  | 'review due'
  | 'with a reason';

export interface Transition {
  from: TrialState;
  event: TrialEvent;
  by: readonly TrialActor[];
  /** `gone`: the trial is no more. */
  to: TrialState | 'gone';
  when?: readonly TrialCondition[];
}

/** Every step a trial can take. What is not here is refused with `not-now`; services, buttons and tests read it alike. */
export const transitions: readonly Transition[] = [
  {
    from: 'draft',
    event: 'send for review',
    by: ['trial.write'],
    to: 'plan review',
    when: ['complete, plan chosen'],
  },
  {
    from: 'draft',
    event: 'start',
    by: ['trial.run'],
    to: 'running',
    when: ['complete, plan chosen', 'no plan review due'],
  },
  { from: 'draft', event: 'change an answer', by: ['trial.write'], to: 'draft' },
  { from: 'draft', event: 'delete', by: ['trial.write'], to: 'gone' },
  {
    from: 'plan review',
    event: 'approve',
    by: ['review.decide', 'safety person'],
    to: 'ready',
    when: ['not the one who asked'],
  },
  {
    from: 'plan review',
    event: 'send back',
    by: ['review.decide', 'safety person'],
    to: 'draft',
    when: ['not the one who asked'],
  },
  { from: 'plan review', event: 'take back', by: ['trial.write'], to: 'draft' },
  {
    from: 'ready',
    event: 'start',
    by: ['trial.run'],
    to: 'running',
    when: ['complete, plan chosen', 'as approved'],
  },
  { from: 'ready', event: 'change an answer', by: ['trial.write'], to: 'draft' },
  { from: 'running', event: 'pause', by: ['trial.run'], to: 'paused' },
  { from: 'running', event: 'hold', by: ['trial.hold'], to: 'held' },
  { from: 'running', event: 'last run closed', by: ['product'], to: 'readings in' },
  { from: 'running', event: 'judge', by: ['trial.run'], to: 'readings in' },
  // A stop for safety tells those on shift, which a pause does not.
  { from: 'paused', event: 'hold', by: ['trial.hold'], to: 'held' },
  { from: 'paused', event: 'resume', by: ['trial.run'], to: 'running' },
  { from: 'paused', event: 'judge', by: ['trial.run'], to: 'readings in' },
  {
    from: 'held',
    event: 'resume',
    by: ['trial.run', 'review.decide', 'safety person'],
    to: 'running',
    when: ['with a reason after held'],
  },
  { from: 'held', event: 'judge', by: ['trial.run'], to: 'readings in' },
  { from: 'readings in', event: 'verdict made', by: ['product'], to: 'deciding', when: ['no review due'] },
  { from: 'readings in', event: 'verdict made', by: ['product'], to: 'verdict review', when: ['review due'] },
  // A verdict that was sent back may be asked about again as it stands.
  {
    from: 'readings in',
    event: 'send for review',
    by: ['trial.write'],
    to: 'verdict review',
    when: ['review due'],
  },
  // A figure that was put right makes the next verdict, and what was agreed to is asked about anew.
  { from: 'readings in', event: 'reading corrected', by: ['product'], to: 'readings in' },
  { from: 'verdict review', event: 'reading corrected', by: ['product'], to: 'readings in' },
  { from: 'deciding', event: 'reading corrected', by: ['product'], to: 'readings in' },
  { from: 'adoption review', event: 'reading corrected', by: ['product'], to: 'readings in' },
  { from: 'readings in', event: 'repeat a run', by: ['trial.run'], to: 'running' },
  { from: 'readings in', event: 'put back a run', by: ['trial.run'], to: 'running' },
  {
    from: 'verdict review',
    event: 'approve',
    by: ['review.decide'],
    to: 'deciding',
    when: ['not the one who asked'],
  },
  {
    from: 'verdict review',
    event: 'send back',
    by: ['review.decide'],
    to: 'readings in',
    when: ['not the one who asked'],
  },
  { from: 'deciding', event: 'plan check runs', by: ['decide'], to: 'running' },
  { from: 'deciding', event: 'repeat a run', by: ['trial.run'], to: 'running' },
  { from: 'deciding', event: 'adopt', by: ['decide'], to: 'closed', when: ['no review due'] },
  { from: 'deciding', event: 'adopt', by: ['decide'], to: 'adoption review', when: ['review due'] },
  { from: 'deciding', event: 'not now', by: ['decide'], to: 'closed' },
  {
    from: 'adoption review',
    event: 'approve',
    by: ['review.decide'],
    to: 'closed',
    when: ['not the one who asked'],
  },
  {
    from: 'adoption review',
    event: 'send back',
    by: ['review.decide'],
    to: 'deciding',
    when: ['not the one who asked'],
  },
  {
    from: 'closed',
    event: 'open again',
    by: ['decide', 'review.decide'],
    to: 'deciding',
    when: ['with a reason'],
  },
];

/** The steps that an event may mean in a state: none, one, or two that a condition tells apart. */
export function transitionsOf(from: TrialState, event: TrialEvent): Transition[] {
  return transitions.filter((each) => each.from === from && each.event === event);
}

/** What a person with these permissions may do in a state, for buttons; conditions are not looked at. */
export function eventsOpenTo(from: TrialState, may: (permission: TrialActor) => boolean): TrialEvent[] {
  const open = transitions
    .filter((each) => each.from === from && each.by.some(may))
    .map(({ event }) => event);
  return [...new Set(open)];
}

/** A list is tidied of any trial that is not being run. */
export function mayPutAway(state: TrialState): boolean {
  return state !== 'running' && state !== 'paused';
}

/** States in which what was typed is still being thought about. */
export function takesAnswers(state: TrialState): boolean {
  return transitionsOf(state, 'change an answer').length > 0;
}
