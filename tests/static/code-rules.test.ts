import { describe, expect, it } from 'vitest';
import { findEnvironmentReads, findSilencedChecks, findStrayQueries, findUnrunTests } from './code-rules.ts';
import { readSources, type Source } from './sources.ts';

const sources = readSources();

type Finder = (sources: Source[]) => string[];

function find(finder: Finder, path: string, text: string) {
  return finder([{ path, text }]);
}

describe('the environment is read in one file', () => {
  it('of the product', () => {
    expect(findEnvironmentReads(sources)).toEqual([]);
  });

  it.each([
    `const port = process.env.PORT;`,
    `const port = process.env['PORT'];`,
    `const port = process['env'].PORT;`,
    `const { env } = process;`,
    `const { env: settings } = process;`,
    `import { env } from 'node:process';`,
    `const isLive = import.meta.env.PROD;`,
  ])('and a read elsewhere is found: %s', (text) => {
    expect(find(findEnvironmentReads, 'src/server/log.ts', text)).toEqual(['src/server/log.ts:1']);
  });

  it('and one in a page is found', () => {
    const text = `---\nconst mode = process.env.APP_MODE;\n---\n<p>{mode}</p>`;
    expect(find(findEnvironmentReads, 'src/pages/index.astro', text)).toHaveLength(1);
  });

  it.each(['src/server/env.ts', 'src/commands/up.mjs', 'src/fakes/settings.ts'])('but %s may', (path) => {
    expect(find(findEnvironmentReads, path, `const port = process.env.PORT;`)).toEqual([]);
  });
});

describe('queries stand in repositories', () => {
  it('and nowhere else', () => {
    expect(findStrayQueries(sources)).toEqual([]);
  });

  it.each([
    `const rows = await db('runs').where({ id });`,
    `const rows = await scope.db('runs').where({ id });`,
    `const rows = await database()('runs');`,
    `await trx('runs').insert(row);`,
    `await scope.db.raw('VACUUM');`,
    `await db.select('id').from('runs');`,
    `const query = 'SELECT id FROM runs';`,
    `const query = \`update runs set state = \${state}\`;`,
  ])('and one in a service is found: %s', (text) => {
    expect(find(findStrayQueries, 'src/features/run/run.service.ts', text).length).toBeGreaterThan(0);
  });

  it.each([
    `const run = await findRun(scope, id);`,
    `await inTransaction({ db: database() }, work);`,
    `const word = t('runs:select from the list');`,
  ])('and a call that is none is let be: %s', (text) => {
    expect(find(findStrayQueries, 'src/features/run/run.service.ts', text)).toEqual([]);
  });

  it('and a repository may hold one', () => {
    expect(find(findStrayQueries, 'src/features/run/run.repository.ts', `db('runs');`)).toEqual([]);
  });
});

describe('every test runs', () => {
  it('in all test files', () => {
    expect(findUnrunTests(sources)).toEqual([]);
  });

  it.each([
    ['it', 'skip', `('later', () => {});`],
    ['describe', 'only', `('this', () => {});`],
    ['test', 'todo', `('some day');`],
    ['it.each([1])', 'skip', `('later', () => {});`],
    ['it', 'runIf', `(true)('now', () => {});`],
    ['it', 'fails', `('is broken', () => {});`],
  ])('and %s marked %s is found', (word, mark, rest) => {
    expect(find(findUnrunTests, 'src/a.test.ts', `${word}.${mark}${rest}`)).toEqual(['src/a.test.ts:1']);
  });

  it.each([`xit('later', () => {});`, `it('later', { skip: true }, () => {});`])(
    'and %s is found',
    (text) => {
      expect(find(findUnrunTests, 'src/a.test.ts', text)).toEqual(['src/a.test.ts:1']);
    },
  );

  it('and a skipped run of a trial is let be', () => {
    expect(find(findUnrunTests, 'src/a.test.ts', `service.skip(run); const a = { skip: true };`)).toEqual([]);
  });
});

describe('no check is silenced', () => {
  it('in any file', () => {
    expect(findSilencedChecks(sources)).toEqual([]);
  });

  it.each(['@ts-' + 'ignore', '@ts-' + 'expect-error', 'biome-' + 'ignore lint/a/b: why'])(
    'and "%s" is found',
    (word) => {
      expect(find(findSilencedChecks, 'src/main.ts', `\n// ${word}\n`)).toEqual(['src/main.ts:2']);
    },
  );
});
