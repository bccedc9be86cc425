import { mkdtempSync, rmSync, symlinkSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { type FreshClone, makeFreshClone } from './fresh-clone.ts';
import { runCommand } from './run-command.ts';

let clone: FreshClone;
let programs: string;

beforeAll(() => {
  clone = makeFreshClone({ withPackages: false });
  programs = mkdtempSync(join(tmpdir(), 'trywell-programs-'));
  symlinkSync(process.execPath, join(programs, 'node'));
});

afterAll(() => {
  clone.remove();
  rmSync(programs, { recursive: true });
});

function putProgram(name: string, body: string) {
  writeFileSync(join(programs, name), `#!/bin/sh\n${body}\n`, { mode: 0o755 });
}

/** Runs a command where nothing is installed but Node and an `npm` that fails in a given way. */
async function runWithFailingNpm(name: string, says: string) {
  putProgram('npm', `echo "${says}" >&2; exit 1`);
  const end = await runCommand(name, { folder: clone.folder, env: { PATH: programs, npm_execpath: '' } });
  return {
    ...end,
    lastError: end.errors.trimEnd().split('\n').at(-1),
    lastLine: end.output.trimEnd().split('\n').at(-1),
  };
}

const compilerSentence =
  'The C++ compiler, make, and Python are missing to build the SQLite driver: ' +
  'run "sudo apt-get install build-essential python3", then try again.';

describe('on a machine without a compiler', () => {
  it.each(['up', 'dev', 'build'])('%s says what to install', async (name) => {
    const end = await runWithFailingNpm(name, 'gyp ERR! not ok');
    expect(end).toMatchObject({ code: 1, lastError: compilerSentence });
  });

  it.each(['test', 'check'])('%s says so and still counts', async (name) => {
    const end = await runWithFailingNpm(name, 'gyp ERR! not ok');
    expect(end).toMatchObject({ code: 1, lastError: compilerSentence, lastLine: '0 passed, 1 failed' });
  });
});

describe('on a machine with a compiler', () => {
  beforeAll(() => {
    for (const name of ['g++', 'make', 'python3']) putProgram(name, 'exit 0');
  });

  it.each([
    ['npm error code ENOTFOUND', /could not be fetched/],
    ['npm error code EACCES', /could not be written/],
    ['npm error code ENOSPC', /the disk is full/],
    ['npm error of another kind', /^npm error of another kind$/],
  ])('"%s" is put into words', async (says, sentence) => {
    expect(await runWithFailingNpm('up', says)).toMatchObject({
      code: 1,
      lastError: expect.stringMatching(sentence),
    });
  });
});

describe('on another Node', () => {
  const asOldNode = [
    '--import',
    'data:text/javascript,Object.defineProperty(process,"versions",{value:{node:"18.19.0"}})',
  ];
  const sentence = 'Trywell runs on Node 20 (20.3 or newer), and this is Node 18.19.0.\n';

  it.each(['up', 'dev', 'build', 'backup', 'restore'])('%s says which one is wanted', async (name) => {
    expect(await runCommand(name, { nodeOptions: asOldNode })).toEqual({
      code: 1,
      output: '',
      errors: sentence,
    });
  });

  it.each(['test', 'check'])('%s says so and still counts', async (name) => {
    const end = await runCommand(name, { nodeOptions: asOldNode });
    expect(end).toEqual({ code: 1, output: '0 passed, 1 failed\n', errors: sentence });
  });
});
