import { copyFileSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, inject } from 'vitest';

// Every integration test file gets a migrated database, a clock to move and nobody to talk to. The settings are in place
// before anything of the product is imported, so `config()` and `database()` see them.
const folder = mkdtempSync(join(tmpdir(), 'trywell-test-'));
copyFileSync(inject('migratedTemplate'), join(folder, 'trywell.sqlite'));

Object.assign(process.env, {
  APP_MODE: 'demo',
  DATA_DIR: folder,
  LOG_LEVEL: 'silent',
  CLOCK_OFFSET_FILE: join(folder, 'clock-offset'),
});

afterAll(async () => {
  const { closeDatabase } = await import('../../src/server/db/connection.ts');
  await closeDatabase();
  rmSync(folder, { recursive: true, force: true });
});

/** Moves the product's clock, in milliseconds from the real time; it counts from the next reading 200 ms later. */
export function moveClock(milliseconds: number): void {
  writeFileSync(join(folder, 'clock-offset'), String(milliseconds));
}
