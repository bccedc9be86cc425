/**
 * What a shop may decide after a verdict. `adopt unchecked`: the new settings without check runs that held; `opened
 * again`: an earlier decision was taken back; `sent back`: the engineer did not agree to the new settings; `holds` and
 * `does not hold`: what was found when they had been used for a while.
 */
export const decisionOutcomes = [
  'adopt',
  'adopt unchecked',
  'not now',
  "keep today's",
  'opened again',
  'sent back',
  'holds',
  'does not hold',
] as const;
export type DecisionOutcome = (typeof decisionOutcomes)[number];

export interface Decision {
  outcome: DecisionOutcome;
  note: string;
  at: number;
}

/** Whether the new settings are in use by what was decided last. Newest first. */
export function isAdopted(decisions: readonly Pick<Decision, 'outcome'>[]): boolean {
  const last = decisions.find(({ outcome }) => outcome !== 'holds' && outcome !== 'does not hold');
  return last?.outcome === 'adopt' || last?.outcome === 'adopt unchecked';
}
