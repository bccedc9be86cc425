import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, expect, it } from 'vitest';
import { hashSources } from './source-hash.mjs';

let folder = '';

beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'trywell-sources-'));
  mkdirSync(join(folder, 'src'));
  write('src/main.ts', 'export {};');
  write('package.json', '{}');
});

afterEach(() => rmSync(folder, { recursive: true }));

function write(path: string, text: string) {
  writeFileSync(join(folder, path), text);
}

it('stays the same for the same sources', () => {
  expect(hashSources(folder)).toBe(hashSources(folder));
});

it.each(['src/main.ts', 'package.json', 'src/new.ts'])('changes with %s', (path) => {
  const before = hashSources(folder);
  write(path, '// other');
  expect(hashSources(folder)).not.toBe(before);
});

it('tells a moved text from an unmoved one', () => {
  write('src/a.ts', 'one');
  const before = hashSources(folder);
  rmSync(join(folder, 'src/a.ts'));
  write('src/b.ts', 'one');
  expect(hashSources(folder)).not.toBe(before);
});

it.each(['src/main.test.ts', 'README.md'])('does not change with %s', (path) => {
  const before = hashSources(folder);
  write(path, 'anything');
  expect(hashSources(folder)).toBe(before);
});
