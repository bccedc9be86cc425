import type { Answers } from './answers.schema.ts';
import type { TrialState } from './trial-states.ts';

/** A trial as the services know it. Moments are milliseconds UTC. */
export interface Trial {
  id: string;
  /** Counts up within the shop. */
  number: number;
  title: string;
  machine: string;
  ownerId: string;
  phase: 'main' | 'check';
  state: TrialState;
  revision: number;
  putAwayAt: number | null;
  createdAt: number;
  updatedAt: number;
}

/** What a trial goes by: its own title, else the machine and the result. Empty while neither is known. */
export function nameTrial(answers: Answers): { title: string; machine: string } {
  const machine = answers.job?.machine?.trim() ?? '';
  const title = answers.job?.title?.trim() ?? '';
  const result = answers.result?.name?.trim() ?? '';
  return { title: title || [machine, result].filter((part) => part !== '').join(', '), machine };
}
