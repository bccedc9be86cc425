/** From here on the supervisor is warned. */
const warnedFrom = 0.8;

export const textStandings = ['enough', 'low', 'used up'] as const;
export type TextStanding = (typeof textStandings)[number];

export interface MonthlyTexts {
  /** Parts, as the service counts and bills them. */
  used: number;
  limit: number;
  standing: TextStanding;
}

export function standingOf(used: number, limit: number): TextStanding {
  if (used >= limit) return 'used up';
  return used >= limit * warnedFrom ? 'low' : 'enough';
}
