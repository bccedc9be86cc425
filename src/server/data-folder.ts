import { accessSync, constants, mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { z } from 'zod';
import { now } from './clock.ts';
import type { Config } from './env.ts';

/** A reason not to start, as one sentence for the person at the terminal. */
export class StartRefusal extends Error {}

const lockSchema = z.object({
  pid: z.number().int(),
  /** The kernel's start tick of the process, where the system tells it: a pid alone may have been given anew. */
  startTick: z.string().nullable(),
  role: z.enum(['all', 'web', 'worker']),
  url: z.string(),
  startedAt: z.number(),
});
export type LockContent = z.output<typeof lockSchema>;

function startTickOf(pid: number): string | null {
  try {
    const afterName = readFileSync(`/proc/${pid}/stat`, 'utf8').split(') ').pop();
    return afterName?.split(' ')[19] ?? null;
  } catch {
    return null;
  }
}

function isAlive(lock: LockContent): boolean {
  try {
    process.kill(lock.pid, 0);
  } catch (error) {
    return (error as NodeJS.ErrnoException).code === 'EPERM';
  }
  return lock.startTick === null || startTickOf(lock.pid) === lock.startTick;
}

function readLock(file: string): LockContent | null {
  try {
    const lock = lockSchema.parse(JSON.parse(readFileSync(file, 'utf8')));
    return isAlive(lock) ? lock : null;
  } catch {
    return null;
  }
}

function lockFile(dataDir: string, role: Config['role']): string {
  return join(dataDir, `trywell-${role}.lock`);
}

/** The process that is running on this data folder, if there is one. */
export function findRunning(dataDir: string): LockContent | null {
  for (const role of ['all', 'web', 'worker'] as const) {
    const lock = readLock(lockFile(dataDir, role));
    if (lock) return lock;
  }
  return null;
}

/**
 * Makes the data folder if need be and takes its lock for this process. Role `all` shares the folder with nobody; `web` and
 * `worker` share it with each other.
 * @returns a function that gives the lock back
 * @throws StartRefusal when the folder cannot be written or another process holds the lock
 */
export function lockDataFolder(settings: Pick<Config, 'dataDir' | 'role' | 'appUrl'>): () => void {
  const { dataDir, role, appUrl } = settings;
  try {
    mkdirSync(dataDir, { recursive: true });
    accessSync(dataDir, constants.W_OK);
  } catch {
    throw new StartRefusal(`The data folder ${dataDir} cannot be written. Choose another with DATA_DIR.`);
  }
  const excluded = role === 'all' ? (['all', 'web', 'worker'] as const) : (['all', role] as const);
  for (const other of excluded) {
    const holder = readLock(lockFile(dataDir, other));
    if (holder) {
      throw new StartRefusal(
        `Trywell already runs on ${dataDir}: see ${holder.url} (process ${holder.pid}).`,
      );
    }
  }
  const file = lockFile(dataDir, role);
  const content: LockContent = {
    pid: process.pid,
    startTick: startTickOf(process.pid),
    role,
    url: appUrl,
    startedAt: now(),
  };
  rmSync(file, { force: true });
  try {
    // `wx` refuses when a second process made the file in the meantime.
    writeFileSync(file, JSON.stringify(content), { flag: 'wx' });
  } catch {
    throw new StartRefusal(`The lock file ${file} cannot be written. Is another start under way?`);
  }
  return () => rmSync(file, { force: true });
}
