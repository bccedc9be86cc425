import { chmodSync, mkdirSync, readdirSync, renameSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import type { Knex } from 'knex';
import type { Config } from '../env.ts';
import { openDatabase } from './connection.ts';
import { copyDatabase } from './migrate.ts';

const keptBackups = 7;
const namePattern = /^daily-\d{4}-\d{2}-\d{2}\.sqlite$/;

/** A copy that could not be trusted. */
export class UnsoundBackup extends Error {}

/** @throws UnsoundBackup when the file is not whole, or a row in it points nowhere */
async function refuseUnsound(file: string): Promise<void> {
  const copy = openDatabase({ kind: 'sqlite', file });
  try {
    const [finding]: { integrity_check: string }[] = await copy.raw('pragma integrity_check(1)');
    const loose: unknown[] = await copy.raw('pragma foreign_key_check');
    if (finding?.integrity_check !== 'ok' || loose.length > 0) {
      throw new UnsoundBackup('the copy of the database does not pass its check');
    }
  } finally {
    await copy.destroy();
  }
}

/** Takes away the oldest daily copies; copies that a person or a migration made are left alone. */
function dropOldest(folder: string): void {
  const copies = readdirSync(folder)
    .filter((name) => namePattern.test(name))
    .sort();
  for (const name of copies.slice(0, -keptBackups)) rmSync(join(folder, name));
}

/**
 * Copies the whole database to `backups/daily-<day>.sqlite`, checks the copy and keeps the last seven. A copy gets its name
 * only when it is sound, so a file of that name can be relied on. Another copy on the same day takes its place.
 * @param day as `2026-12-01`
 * @returns the file; null where the database is not a file of ours
 * @throws UnsoundBackup
 */
export async function backUpDaily(
  db: Knex,
  settings: Pick<Config, 'database' | 'dataDir'>,
  day: string,
): Promise<string | null> {
  if (settings.database.kind !== 'sqlite') return null;
  const folder = join(settings.dataDir, 'backups');
  mkdirSync(folder, { recursive: true });
  const file = join(folder, `daily-${day}.sqlite`);
  const unfinished = `${file}.unfinished`;
  const leftovers = ['', '-wal', '-shm'].map((end) => `${unfinished}${end}`);
  for (const leftover of leftovers) rmSync(leftover, { force: true });
  try {
    await copyDatabase(db, unfinished);
    chmodSync(unfinished, 0o600);
    await refuseUnsound(unfinished);
    renameSync(unfinished, file);
  } finally {
    for (const leftover of leftovers) rmSync(leftover, { force: true });
  }
  dropOldest(folder);
  return file;
}
