import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import ts from 'typescript';
import { expect, it } from 'vitest';
import { projectFolder } from './sources.ts';

const commands = join(projectFolder, 'src/commands');
const version = 'begin/node-version.mjs';
const entries = readdirSync(commands).filter((name) => name.endsWith('.mjs'));

/** Whether a text is free of all that came into the language after 2018: compiling it down to 2018 then changes nothing. */
function isOldSyntax(text: string): boolean {
  const compileTo = (target: ts.ScriptTarget) =>
    ts.transpileModule(text, { compilerOptions: { target, module: ts.ModuleKind.ESNext } }).outputText;
  return compileTo(ts.ScriptTarget.ES2018) === compileTo(ts.ScriptTarget.ESNext);
}

function read(name: string): string {
  return readFileSync(join(commands, name), 'utf8');
}

it('there are entries', () => {
  expect(entries).toContain('up.mjs');
  expect(entries).toContain('test.mjs');
});

// A Node too old for the product must still be able to read the sentence that says so.
it.each([...entries, version])('%s is read by any Node', (name) => {
  expect(isOldSyntax(read(name))).toBe(true);
  expect(read(name)).not.toMatch(/'node:|^await/m);
});

it.each(entries)('%s imports nothing at once but the check of the version', (name) => {
  expect([...read(name).matchAll(/^import .*$/gm)].map(([line]) => line)).toEqual([
    `import { begin } from './${version}';`,
  ]);
});

it('newer syntax would be found', () => {
  for (const text of ['a ?? b;', 'a?.b;', 'a ||= b;', 'class A { #b = 1; }', 'try { a(); } catch { b(); }'])
    expect(isOldSyntax(text)).toBe(false);
});
