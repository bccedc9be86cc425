import type { Knex } from 'knex';
import { now } from '../server/clock.ts';
import { describeError, log } from '../server/log.ts';
import { sleepingJobs } from '../server/wake.ts';

/** What a job gets to work with; `stopping` turns true when the process was asked to end. */
export interface JobContext {
  readonly db: Knex;
  readonly workerId: string;
  readonly stopping: () => boolean;
}

/** One kind of background work. It must be safe to run twice, and safe beside another worker. */
export interface Job {
  name: string;
  /** The pause between the end of one pass and the start of the next, in milliseconds. */
  everyMilliseconds: number;
  /** Does what is due and says how much there was; a pass that did something is followed by another at once. */
  run(context: JobContext): Promise<number>;
}

function sleepUntilWoken(milliseconds: number, signal: AbortSignal): Promise<void> {
  return new Promise((resolve) => {
    const sleepers = sleepingJobs();
    const done = () => {
      clearTimeout(timer);
      sleepers.delete(done);
      signal.removeEventListener('abort', done);
      resolve();
    };
    const timer = setTimeout(done, milliseconds);
    sleepers.add(done);
    signal.addEventListener('abort', done);
    if (signal.aborted) done();
  });
}

async function repeat(job: Job, context: JobContext, signal: AbortSignal): Promise<void> {
  while (!signal.aborted) {
    let done = 0;
    try {
      done = await job.run(context);
      if (done > 0) log.debug({ event: 'job-done', job: job.name, count: done });
    } catch (error) {
      // A failed pass must not end the loop: the next one finds the same work again.
      log.error({ event: 'job-failed', job: job.name, error: describeError(error) });
    }
    if (done === 0 && !signal.aborted) await sleepUntilWoken(job.everyMilliseconds, signal);
  }
}

export interface RunningWorker {
  /** Ends after the passes that are under way. */
  stop(): Promise<void>;
}

/** Starts all jobs, each in its own loop. */
export function startWorker(jobs: Job[], db: Knex): RunningWorker {
  const stopping = new AbortController();
  const workerId = `${process.pid}-${now().toString(36)}`;
  const context: JobContext = { db, workerId, stopping: () => stopping.signal.aborted };
  const loops = jobs.map((job) => repeat(job, context, stopping.signal));
  return {
    async stop() {
      stopping.abort();
      await Promise.all(loops);
    },
  };
}
