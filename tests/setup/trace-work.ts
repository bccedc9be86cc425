import type { Browser } from 'playwright-core';

interface TraceEvent {
  name: string;
  /** Microseconds of the thread's own time: what other work on the machine takes is not among them. */
  tdur?: number;
}

const pieces: readonly string[] = ['EventDispatch', 'FunctionCall', 'HandlePostMessage', 'TimerFire'];

/**
 * Begins to watch what the pages' threads do.
 * @returns ends the watching and answers the longest single piece of script, in milliseconds, on this machine at full speed
 */
export async function traceWork(browser: Browser): Promise<() => Promise<number>> {
  const session = await browser.newBrowserCDPSession();
  const events: TraceEvent[] = [];
  session.on('Tracing.dataCollected', ({ value }) => events.push(...(value as unknown as TraceEvent[])));
  const ended = new Promise((done) => session.on('Tracing.tracingComplete', done));
  await session.send('Tracing.start', { traceConfig: { includedCategories: ['devtools.timeline'] } });
  return async () => {
    await session.send('Tracing.end');
    await ended;
    const worked = events.filter(({ name }) => pieces.includes(name)).map(({ tdur = 0 }) => tdur / 1_000);
    if (worked.length === 0) throw new RangeError('traceWork: nothing was watched');
    return Math.max(...worked);
  };
}
