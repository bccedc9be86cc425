import { once } from 'node:events';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import type { Knex } from 'knex';
import { openDatabase } from '../../../src/server/db/connection.ts';
import { startStandIns, testAccount } from '../../integration/stand-ins.ts';
import { type ChildProgram, startProgram } from '../../setup/child-program.ts';
import { findFreePort } from '../../setup/free-port.ts';

const main = fileURLToPath(new URL('../../../dist/main/main.mjs', import.meta.url));
/** Longer than a worker's lease on a text: what the killed one had in hand is looked into at once. */
const leaseOverMilliseconds = 61_000;

export type Role = 'web' | 'worker';

/**
 * The built product as two programs, web and worker, on a data folder of their own.
 * @param prepare fills the database before they start
 */
export async function openTwoPrograms<Prepared>(prepare: (db: Knex) => Promise<Prepared>) {
  const folder = mkdtempSync(join(tmpdir(), 'trywell-killed-'));
  const clockFile = join(folder, 'clock-offset');
  const port = String(await findFreePort());
  const url = `http://127.0.0.1:${port}`;
  const standIns = await startStandIns(url, { ...testAccount, clockOffsetFile: clockFile });
  const start = (role: Role): Promise<ChildProgram> =>
    startProgram(main, {
      ROLE: role,
      PORT: port,
      APP_URL: url,
      DATA_DIR: folder,
      CLOCK_OFFSET_FILE: clockFile,
      TWILIO_ACCOUNT_SID: testAccount.accountSid,
      TWILIO_AUTH_TOKEN: testAccount.authToken,
      TWILIO_API_URL: standIns.textsUrl,
      SMTP_PORT: String(standIns.smtpPort),
      TEXTS_PER_SECOND: '100',
      LOG_LEVEL: 'error',
    });
  // The first start makes the tables; what is prepared then has the database to itself.
  await (await start('worker')).stop();
  const db = openDatabase({ kind: 'sqlite', file: join(folder, 'trywell.sqlite') });
  const prepared = await prepare(db);
  const programs = { worker: await start('worker'), web: await start('web') };
  let ahead = 0;
  return {
    url,
    standIns,
    db,
    prepared,
    /** SIGKILL, as a power cut would, and up again. */
    async kill(role: Role): Promise<void> {
      const { process: child } = programs[role];
      child.kill('SIGKILL');
      if (child.exitCode === null && child.signalCode === null) await once(child, 'exit');
      if (role === 'worker') {
        ahead += leaseOverMilliseconds;
        writeFileSync(clockFile, String(ahead));
      }
      programs[role] = await start(role);
    },
    async close(): Promise<void> {
      await db.destroy();
      await Promise.all([programs.web.stop(), programs.worker.stop()]);
      await standIns.stop();
      rmSync(folder, { recursive: true, force: true });
    },
  };
}
