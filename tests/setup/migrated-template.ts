import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import type { TestProject } from 'vitest/node';

declare module 'vitest' {
  export interface ProvidedContext {
    migratedTemplate: string;
  }
}

/** Migrates one empty database before all tests; each test file works on a copy of its own. */
export default async function prepare(project: TestProject): Promise<() => Promise<void>> {
  const folder = await mkdtemp(join(tmpdir(), 'trywell-template-'));
  const settings = {
    database: { kind: 'sqlite' as const, file: join(folder, 'trywell.sqlite') },
    dataDir: folder,
  };
  process.env['LOG_LEVEL'] = 'silent';
  const { openDatabase } = await import('../../src/server/db/connection.ts');
  const { migrateToLatest } = await import('../../src/server/db/migrate.ts');
  const db = openDatabase(settings.database);
  await migrateToLatest(db, settings);
  await db.destroy();
  project.provide('migratedTemplate', settings.database.file);
  return () => rm(folder, { recursive: true, force: true });
}
