import { existsSync, readFileSync, writeFileSync } from 'node:fs';
import { createServer } from 'node:net';
import { join } from 'node:path';
import Sqlite from 'better-sqlite3';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { findFreePort } from '../../setup/free-port.ts';
import { type FreshClone, makeFreshClone } from './fresh-clone.ts';
import { runCommand, type StartedCommand, startCommand } from './run-command.ts';

const buildingTime = 240_000;
const welcome = 'Ctrl-C ends it all';

let clone: FreshClone;
let env: Record<string, string>;

beforeAll(async () => {
  clone = makeFreshClone({ withPackages: true });
  const [port, httpPort, smtpPort] = [await findFreePort(), await findFreePort(), await findFreePort()];
  env = { PORT: `${port}`, FAKES_HTTP_PORT: `${httpPort}`, FAKES_SMTP_PORT: `${smtpPort}` };
});

afterAll(() => clone.remove());

function startUp(): StartedCommand {
  return startCommand('up', { folder: clone.folder, env });
}

function urlOf(port: string | undefined): string {
  return `http://127.0.0.1:${port}`;
}

async function answers(url: string): Promise<boolean> {
  return fetch(url).then(
    () => true,
    () => false,
  );
}

function pidOfLock(): number {
  return JSON.parse(readFileSync(join(clone.folder, 'data/trywell-all.lock'), 'utf8')).pid;
}

/** Renames the shop beneath the product, to see whether it is still so after the next start. */
function changeShopName(name: string): void {
  const db = new Sqlite(join(clone.folder, 'data/trywell.sqlite'));
  db.prepare('UPDATE shops SET name = ?').run(name);
  db.close();
}

function readShopNames(): unknown[] {
  const db = new Sqlite(join(clone.folder, 'data/trywell.sqlite'), { readonly: true });
  const names = db.prepare('SELECT name FROM shops').pluck().all();
  db.close();
  return names;
}

describe('npm run up', { timeout: buildingTime }, () => {
  it('takes a fresh clone to the front page, and ends on SIGTERM leaving nothing behind', async () => {
    const up = startUp();
    await up.waitFor(welcome);
    expect(up.output()).toContain('Building');
    expect(up.output()).toContain(`Trywell runs at ${urlOf(env['PORT'])}`);
    expect(up.output()).toMatch(/Sign in as\n {2}supervisor .+@.+\n {2}engineer .+@.+\n {2}admin .+@.+/);
    const page = await fetch(urlOf(env['PORT']));
    expect([page.status, await page.text()]).toEqual([200, expect.stringContaining('<h1')]);
    expect(up.output()).toContain(urlOf(env['FAKES_HTTP_PORT']));
    expect(await answers(urlOf(env['FAKES_HTTP_PORT']))).toBe(true);

    const pid = pidOfLock();
    up.process.kill('SIGTERM');
    expect(await up.ended).toMatchObject({
      code: 0,
      errors: '',
      output: expect.stringContaining('Your data is kept'),
    });
    expect(() => process.kill(pid, 0)).toThrow(/ESRCH/);
    expect(await answers(urlOf(env['PORT']))).toBe(false);
    expect(await answers(urlOf(env['FAKES_HTTP_PORT']))).toBe(false);
    expect(existsSync(join(clone.folder, 'data/trywell-all.lock'))).toBe(false);
  });

  it('keeps the data, does not build again, and says where it runs when asked twice', async () => {
    changeShopName('Renamed Foods');
    const up = startUp();
    await up.waitFor(welcome);
    expect(up.output()).not.toContain('Building');
    expect(readShopNames()).toEqual(['Renamed Foods']);

    const second = await runCommand('up', { folder: clone.folder, env });
    expect(second).toEqual({
      code: 0,
      output: `Trywell already runs at ${urlOf(env['PORT'])} (process ${pidOfLock()}).\n`,
      errors: '',
    });
    up.process.kill('SIGINT');
    expect((await up.ended).code).toBe(0);
  });

  it('starts over a lock that a killed process left', async () => {
    const lock = { pid: process.pid, startTick: 'another', role: 'all', url: 'http://nowhere', startedAt: 0 };
    writeFileSync(join(clone.folder, 'data/trywell-all.lock'), JSON.stringify(lock));
    const up = startUp();
    await up.waitFor(welcome);
    up.process.kill('SIGTERM');
    expect((await up.ended).code).toBe(0);
  });

  it('says so and ends when the product dies beneath it', async () => {
    const up = startUp();
    await up.waitFor(welcome);
    process.kill(pidOfLock(), 'SIGKILL');
    const end = await up.ended;
    expect(end).toMatchObject({ code: 1, errors: expect.stringContaining('Trywell ended by itself') });
    expect(await answers(urlOf(env['FAKES_HTTP_PORT']))).toBe(false);
  });
});

describe('npm run up refuses in one sentence', { timeout: buildingTime }, () => {
  async function expectRefusal(change: Record<string, string>, sentence: string | RegExp) {
    const end = await runCommand('up', { folder: clone.folder, env: { ...env, ...change } });
    expect(end.errors.trimEnd().split('\n')).toEqual([expect.stringMatching(sentence)]);
    expect(end.code).toBe(1);
  }

  it.each(['PORT', 'FAKES_HTTP_PORT', 'FAKES_SMTP_PORT'])('when the port of %s is taken', async (name) => {
    const port = await findFreePort();
    const server = createServer().listen(port, '127.0.0.1');
    await expectRefusal({ [name]: `${port}` }, new RegExp(`^Port ${port} is taken by another program`));
    server.close();
  });

  it('when the data folder cannot be written', async () => {
    const inTheWay = join(clone.folder, 'README.md', 'data');
    await expectRefusal({ DATA_DIR: inTheWay }, /^The data folder .*README\.md\/data cannot be written\./);
  });

  it('when the configuration is wrong', async () => {
    await expectRefusal(
      { TWILIO_AUTH_TOKEN: 'alone' },
      /TWILIO_ACCOUNT_SID and TWILIO_AUTH_TOKEN go together/,
    );
  });

  it('when live mode lacks its keys, naming each', async () => {
    await expectRefusal(
      { APP_MODE: 'live' },
      /APP_URL is missing.*APP_SECRET is missing.*SMTP_HOST is missing/,
    );
  });
});
