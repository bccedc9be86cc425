import { type ChildProcess, spawn } from 'node:child_process';
import { once } from 'node:events';
import {
  copyFileSync,
  existsSync,
  mkdirSync,
  mkdtempSync,
  readdirSync,
  readFileSync,
  rmSync,
  statSync,
  writeFileSync,
} from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';
import { fileURLToPath } from 'node:url';
import Sqlite from 'better-sqlite3';
import { afterEach, beforeEach, describe, expect, inject, it } from 'vitest';
import { runCommand } from './run-command.ts';

let folder: string;
let database: string;
let backup: string;

beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'trywell-backup-'));
  mkdirSync(join(folder, 'data'));
  database = join(folder, 'data/trywell.sqlite');
  backup = join(folder, 'backup.sqlite');
  copyFileSync(inject('migratedTemplate'), database);
});

afterEach(() => rmSync(folder, { recursive: true }));

function run(name: 'backup' | 'restore', ...args: string[]) {
  return runCommand(name, { args, env: { DATA_DIR: join(folder, 'data') } });
}

function query(file: string, statement: string): unknown[] {
  const db = new Sqlite(file, { fileMustExist: true });
  const rows = db.prepare(statement).raw().all();
  db.close();
  return rows;
}

function execute(file: string, statement: string): void {
  const db = new Sqlite(file, { fileMustExist: true });
  db.exec(statement);
  db.close();
}

function readPair(file: string): unknown[] {
  return query(file, `SELECT value FROM app_state WHERE key LIKE 'pair.%'`).flat();
}

/** Every row of every table, to compare two databases whole. */
function dump(file: string): Record<string, unknown[]> {
  const tables = query(file, `SELECT name FROM sqlite_master WHERE type = 'table' ORDER BY name`).flat();
  return Object.fromEntries(tables.map((table) => [String(table), query(file, `SELECT * FROM "${table}"`)]));
}

const writer = fileURLToPath(new URL('./write-pairs.mjs', import.meta.url));

async function startWriting(...options: string[]): Promise<ChildProcess> {
  const child = spawn(process.execPath, [writer, database, ...options], {
    stdio: ['ignore', 'pipe', 'inherit'],
  });
  await once(child.stdout, 'data');
  return child;
}

async function stopWriting(child: ChildProcess): Promise<string> {
  const last = child.stdout ? once(child.stdout, 'data') : Promise.resolve([]);
  const ended = once(child, 'exit');
  child.kill('SIGTERM');
  const [text] = await last;
  await ended;
  return /last (\d+)/.exec(String(text))?.[1] ?? '';
}

describe('npm run backup', () => {
  it('copies one moment of a database that is written to', async () => {
    const child = await startWriting();
    await wait(300);
    const end = await run('backup', backup);
    await wait(100);
    const last = Number(await stopWriting(child));
    expect(end).toMatchObject({ code: 0, errors: '', output: expect.stringContaining('checked') });
    const [left, right] = readPair(backup);
    expect(left).toBe(right);
    expect(Number(left)).toBeGreaterThan(0);
    expect(Number(left)).toBeLessThan(last);
    expect(query(backup, 'PRAGMA integrity_check')).toEqual([['ok']]);
  });

  it('keeps the copy from other accounts, and leaves nothing else behind', async () => {
    await run('backup', backup);
    expect(statSync(backup).mode & 0o777).toBe(0o600);
    expect(readdirSync(folder).sort()).toEqual(['backup.sqlite', 'data']);
    expect(dump(backup)).toEqual(dump(database));
  });

  it.each([
    ['no file is named', [], /^Name one file: npm run backup -- FILE/],
    ['the file is there already', ['data/trywell.sqlite'], /is already there: name another file/],
    ['its folder is not there', ['nowhere/backup.sqlite'], /cannot be written/],
  ])('refuses when %s', async (_case, names, sentence) => {
    const end = await run('backup', ...names.map((name) => join(folder, name)));
    expect(end).toMatchObject({ code: 1, output: '', errors: expect.stringMatching(sentence) });
    expect(end.errors.trimEnd()).not.toContain('\n');
  });

  it('refuses to copy a damaged database', async () => {
    const bytes = readFileSync(database);
    writeFileSync(database, bytes.fill(0xff, 4096, bytes.length - 4096));
    const end = await run('backup', backup);
    expect(end).toMatchObject({ code: 1, errors: expect.stringMatching(/damaged|cannot be used/) });
    expect(readdirSync(folder)).toEqual(['data']);
  });
});

describe('npm run restore', () => {
  const replaced = () =>
    readdirSync(join(folder, 'data')).find((name) => name.startsWith('trywell-replaced-')) ?? '';

  beforeEach(async () => {
    execute(database, `INSERT INTO app_state (key, value) VALUES ('mark', 'saved')`);
    await run('backup', backup);
    execute(database, `UPDATE app_state SET value = 'changed since' WHERE key = 'mark'`);
  });

  it('puts back all that was saved, and keeps what it replaces', async () => {
    const before = dump(database);
    expect(await run('restore', backup)).toMatchObject({ code: 0, errors: '' });
    expect(dump(database)).toEqual(dump(backup));
    expect(dump(join(folder, 'data', replaced()))).toEqual(before);
    expect(readdirSync(join(folder, 'data')).sort()).toEqual([replaced(), 'trywell.sqlite'].sort());
  });

  it('keeps what a failed machine had written last, and mixes nothing of it into the restored', async () => {
    const child = await startWriting('--leave-open');
    await wait(300);
    const last = await stopWriting(child);
    expect(existsSync(`${database}-wal`)).toBe(true);
    expect(await run('restore', backup)).toMatchObject({ code: 0, errors: '' });
    expect(readPair(database)).toEqual([]);
    expect(readPair(join(folder, 'data', replaced()))).toEqual([last, last]);
  });

  it('restores into an empty data folder', async () => {
    rmSync(join(folder, 'data'), { recursive: true });
    expect(await run('restore', backup)).toMatchObject({ code: 0, errors: '' });
    expect(dump(database)).toEqual(dump(backup));
  });

  async function expectRefusal(file: string, sentence: RegExp) {
    const before = dump(database);
    const end = await run('restore', file);
    expect(end).toMatchObject({ code: 1, output: '', errors: expect.stringMatching(sentence) });
    expect(end.errors.trimEnd()).not.toContain('\n');
    expect(dump(database)).toEqual(before);
    expect(replaced()).toBe('');
  }

  it('refuses while the product runs', async () => {
    const lock = join(folder, 'data/trywell-web.lock');
    writeFileSync(lock, JSON.stringify({ pid: process.pid, startTick: null, role: 'web', url: 'http://x' }));
    await expectRefusal(backup, /^Trywell runs \(process \d+, http:\/\/x\): end it first/);
    expect(existsSync(lock)).toBe(true);
  });

  it('refuses a file that is not there', () => expectRefusal(join(folder, 'nothing'), /^There is no file/));

  it('refuses a file that is no database', async () => {
    writeFileSync(backup, 'words and more words, but no database at all\n'.repeat(200));
    await expectRefusal(backup, /it is not a database\. Nothing was changed/);
  });

  it('refuses a database of something else', async () => {
    const other = join(folder, 'other.sqlite');
    const db = new Sqlite(other);
    db.exec('CREATE TABLE things (id)');
    db.close();
    await expectRefusal(other, /it is not a database of Trywell/);
  });

  it('refuses half a file', async () => {
    const bytes = readFileSync(backup);
    writeFileSync(backup, bytes.subarray(0, Math.floor(bytes.length / 2)));
    await expectRefusal(backup, /it is damaged/);
  });

  it('refuses what a newer version made, and names the step', async () => {
    execute(
      backup,
      `INSERT INTO knex_migrations (name, batch, migration_time) VALUES ('29990101000000_later.ts', 9, 0)`,
    );
    await expectRefusal(backup, /a newer version of Trywell made it \(29990101000000_later\.ts\)/);
  });
});
