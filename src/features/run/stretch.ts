/** What may change under a trial, so that runs before and after do not quite belong together. */
export const changeKinds = ['new batch', 'repair', 'new gauge', 'long stop', 'other shift', 'other'] as const;
export type ChangeKind = (typeof changeKinds)[number];

export const stretchKinds = ['start', ...changeKinds] as const;
