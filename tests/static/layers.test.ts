import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { findBrowserFaults } from './browser-faults.ts';
import { findLayerFaults } from './layer-faults.ts';
import { layers } from './layers.ts';
import { projectFolder, readSources } from './sources.ts';

const { dependencies, devDependencies } = JSON.parse(readFileSync(`${projectFolder}package.json`, 'utf8'));
const packages = {
  dependencies: new Set(Object.keys(dependencies)),
  devDependencies: new Set(Object.keys(devDependencies)),
};

function faultsOf(path: string, text: string) {
  return findLayerFaults([{ path, text }], packages);
}

describe('imports follow the arrows of the layout', () => {
  // Reads and parses the whole product, which takes its time on a busy machine.
  it('in every file', { timeout: 180_000 }, () => {
    expect(findLayerFaults(readSources(), packages)).toEqual([]);
  });

  it('and no layer names one that does not exist', () => {
    const names = new Set(['*', ...layers.map((layer) => layer.name)]);
    expect(layers.flatMap((layer) => layer.mayImport.filter((name) => !names.has(name)))).toEqual([]);
  });

  it('and no path is given another name in tsconfig.json', () => {
    const { compilerOptions } = JSON.parse(readFileSync(`${projectFolder}tsconfig.json`, 'utf8'));
    expect(compilerOptions).not.toHaveProperty('paths');
    expect(compilerOptions).not.toHaveProperty('baseUrl');
  });

  it.each([
    ['src/features/trial/Board.tsx', `import { loadBoard } from './board.service.ts';`],
    ['src/features/trial/Board.tsx', `import { rows } from './board.repository.ts';`],
    ['src/features/trial/Board.tsx', `import { log } from '../../server/log.ts';`],
    ['src/features/trial/trial.ts', `import { config } from '../../server/env.ts';`],
    ['src/features/trial/trial.service.ts', `import { Board } from './Board.tsx';`],
    ['src/features/trial/trial.service.ts', `export { start } from '../../worker/loop.ts';`],
    ['src/server/log.ts', `import { trial } from '../features/trial/trial.ts';`],
    ['src/server/log.ts', `import { fakes } from '../fakes/start.ts';`],
    ['src/worker/loop.ts', `const page = await import('../pages/index.astro');`],
    ['src/worker/loop.ts', `import { defineMiddleware } from 'astro:middleware';`],
    ['src/worker/loop.ts', `import { something } from 'astro/runtime';`],
    ['src/worker/loop.ts', `import { beat } from './beat';`],
    ['src/worker/loop.ts', `import { chromium } from 'playwright-core';`],
    ['src/worker/loop.ts', `import { log } from '@/server/log.ts';`],
    ['src/worker/loop.ts', `import nobody from 'a-package-nobody-named';`],
    ['src/lib/doe/fit.ts', `import { readFileSync } from 'node:fs';`],
    ['src/lib/doe/fit.ts', `import type { Language } from '../../i18n/languages.ts';`],
    ['src/lib/doe/fit.ts', `import { DateTime } from 'luxon';`],
    ['src/lib/messages/read.ts', `import { fit } from '../doe/fit.ts';`],
    ['src/components/ui/Button.tsx', `import { trial } from '../../features/trial/trial.ts';`],
    ['src/layouts/PageLayout.astro', `---\nimport { jobs } from '../worker/jobs.ts';\n---\n<p></p>`],
    ['seeds/demo.ts', `import { getEntry } from 'astro:content';`],
    ['src/commands/up.mjs', `import { config } from '../server/env.ts';`],
    ['src/other/thing.ts', ''],
  ])('a fault in %s is found: %s', (path, text) => {
    expect(faultsOf(path, text)).toHaveLength(1);
  });

  it.each([
    ['src/features/trial/Board.tsx', `import { trial } from './trial.ts'; import { useState } from 'react';`],
    [
      'src/pages/index.astro',
      `---\nimport { load } from '../features/trial/trial.service.ts';\n---\n<p></p>`,
    ],
    ['src/server/http/reader.ts', `import type { APIContext } from 'astro';`],
    ['src/lib/doe/fit.ts', `import { Matrix } from 'ml-matrix'; import { model } from './model.ts';`],
  ])('an import along the arrows in %s is let be: %s', (path, text) => {
    expect(faultsOf(path, text)).toEqual([]);
  });
});

describe('no server code reaches the browser', () => {
  it('from any island', () => {
    expect(findBrowserFaults(readSources())).toEqual([]);
  });

  const rules = 'src/features/trial/trial.ts';
  const island = { path: 'src/features/trial/Board.tsx', text: `import { x } from './trial.ts';` };

  it.each([
    `import { createHash } from 'node:crypto';`,
    `import knex from 'knex';`,
    `import { log } from '../../server/log.ts';`,
    `const words = import.meta.glob('../../../locales/*/*.json', { eager: true });`,
  ])('a fault two steps away is found: %s', (text) => {
    const server = { path: 'src/server/log.ts', text: '' };
    expect(findBrowserFaults([island, { path: rules, text }, server])).toHaveLength(1);
  });

  it('and a type alone is let be', () => {
    expect(findBrowserFaults([island, { path: rules, text: `import type { Knex } from 'knex';` }])).toEqual(
      [],
    );
  });
});
