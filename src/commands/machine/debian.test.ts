import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import {
  browserTools,
  compilerTools,
  explainMissing,
  findMissing,
  installDebianPackages,
} from './debian.mjs';

let folder = '';

beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'trywell-path-'));
  vi.stubEnv('PATH', folder);
});

afterEach(() => {
  vi.unstubAllEnvs();
  rmSync(folder, { recursive: true });
});

function putProgram(name: string, mode = 0o755) {
  writeFileSync(join(folder, name), '#!/bin/sh\n', { mode });
}

describe('findMissing', () => {
  it('finds all tools missing on an empty machine', () => {
    expect(findMissing(compilerTools)).toEqual(compilerTools);
  });

  it('is content with any of the programs of a tool', () => {
    putProgram('chromium-browser');
    expect(findMissing(browserTools).map((tool) => tool.purpose)).toEqual(['pdftotext']);
  });
});

it('names each missing package once, in one sentence', () => {
  expect(explainMissing(compilerTools)).toBe(
    'The C++ compiler, make, and Python are missing: ' +
      'run "sudo apt-get install build-essential python3", then try again.',
  );
});

it('refuses to install where apt is absent', async () => {
  await expect(installDebianPackages(compilerTools)).rejects.toThrow(
    /apt-get install build-essential python3/,
  );
});
