/**
 * What a shop may decide after a verdict. `adopt unchecked`: the new settings without check runs that held; `opened
 * again`: an earlier decision was taken back.
 */
export const decisionOutcomes = [
  'adopt',
  'adopt unchecked',
  'not now',
  "keep today's",
  'opened again',
] as const;
export type DecisionOutcome = (typeof decisionOutcomes)[number];

export interface Decision {
  outcome: DecisionOutcome;
  note: string;
  at: number;
}

/** Whether the new settings are in use by what was decided last. Newest first. */
export function isAdopted(decisions: readonly Pick<Decision, 'outcome'>[]): boolean {
  return decisions[0]?.outcome === 'adopt' || decisions[0]?.outcome === 'adopt unchecked';
}
