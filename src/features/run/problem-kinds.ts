/** What tops the board until somebody deals with it. */
export const problemKinds = [
  /** Something is wrong at the machine. */
  'problem',
  /** Somebody with an open run texted STOP, and may have meant the machine. */
  'stop',
  /** Danger where no trial could be held for it. */
  'danger',
  /** A setting cannot be reached: that run waits for a decision. */
  'cannot',
  /** A text for a run that is closed. */
  'late',
  /** Texts that could not be read. */
  'unread',
] as const;
export type ProblemKind = (typeof problemKinds)[number];

/** While one of these is open, the trial sends no runs. */
export const blockingKinds: readonly ProblemKind[] = ['problem', 'stop', 'danger'];
