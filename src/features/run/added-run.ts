/** Runs that may be put before the next one: after a cold start, or after a long stop. */
export const addedRunKinds = ['warm-up', 'middle'] as const;
export type AddedRunKind = (typeof addedRunKinds)[number];
