/** What becomes of a run whose setting cannot be reached: made as far as it got, made last, or left out. */
export const cannotDecisions = ['use', 'later', 'rule out'] as const;
export type CannotDecision = (typeof cannotDecisions)[number];
