const key = Symbol.for('trywell.wake');
const holder = globalThis as { [key]?: Set<() => void> };

/** Jobs of this process that wait for their next turn. Kept on `globalThis`, as the pages are a bundle of their own. */
export function sleepingJobs(): Set<() => void> {
  holder[key] ??= new Set();
  return holder[key];
}

/** Lets waiting jobs of this process look at once instead of at their next turn. Call it after the commit. */
export function wakeWorker(): void {
  for (const wake of sleepingJobs()) wake();
}
