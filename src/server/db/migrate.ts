import { existsSync, mkdirSync } from 'node:fs';
import { join } from 'node:path';
import type { Knex } from 'knex';
import { now } from '../clock.ts';
import { type Config, config } from '../env.ts';
import { log } from '../log.ts';

const migrationModules = import.meta.glob<Knex.Migration>('../../../migrations/*.ts', { eager: true });
const seedModules = import.meta.glob<Knex.Seed>('../../../seeds/*.ts', { eager: true });

function fileName(path: string): string {
  return path.slice(path.lastIndexOf('/') + 1);
}

/** The migrations that are bundled with the product, under the names that the command line gives them too. */
export const bundledMigrations: Knex.MigrationSource<string> = {
  getMigrations: async () => Object.keys(migrationModules).sort(),
  getMigrationName: fileName,
  getMigration: async (path) => {
    const migration = migrationModules[path];
    if (!migration) throw new RangeError('bundledMigrations.getMigration: path names no migration');
    return migration;
  },
};

/** Copies the whole database into one file while it is in use. */
export async function copyDatabase(db: Knex, file: string): Promise<void> {
  await db.raw('VACUUM INTO ?', [file]);
}

async function backUpBeforeChange(db: Knex, pending: string[], dataDir: string): Promise<void> {
  const folder = join(dataDir, 'backups');
  mkdirSync(folder, { recursive: true });
  const stamp = new Date(now()).toISOString().replace(/[:.]/g, '-');
  await copyDatabase(db, join(folder, `before-${pending[0]?.replace(/\.ts$/, '')}-${stamp}.sqlite`));
}

/**
 * Brings the database to the present version. A database that already holds data is copied to `backups/` first. Call it
 * holding the data folder's lock: a migration lock still set then belongs to a process that was killed, and is freed.
 */
export async function migrateToLatest(
  db: Knex,
  settings: Pick<Config, 'database' | 'dataDir'>,
): Promise<void> {
  const migrationConfig = { migrationSource: bundledMigrations };
  if (await db.schema.hasTable('knex_migrations_lock'))
    await db.migrate.forceFreeMigrationsLock(migrationConfig);
  const [completed, pending] = (await db.migrate.list(migrationConfig)) as [unknown[], string[]];
  if (pending.length === 0) return;
  const hasData =
    completed.length > 0 && settings.database.kind === 'sqlite' && existsSync(settings.database.file);
  if (hasData) await backUpBeforeChange(db, pending.map(fileName), settings.dataDir);
  await db.migrate.latest(migrationConfig);
  log.info({ event: 'migrated', count: pending.length });
}

/** Fills an empty database with the demo shop. A database that holds any shop is left alone. */
export async function seedDemo(db: Knex): Promise<void> {
  if (config().mode !== 'demo' || (await db('shops').first('id'))) return;
  for (const path of Object.keys(seedModules).sort()) await seedModules[path]?.seed(db);
  log.info({ event: 'seeded' });
}
