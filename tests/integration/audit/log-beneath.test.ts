import { execFile } from 'node:child_process';
import { promisify } from 'node:util';
import { expect, it } from 'vitest';
import { recordActivity } from '../../../src/server/db/activity-log.ts';
import { inTransaction } from '../../../src/server/db/in-transaction.ts';
import { allowChanges, refuseChanges } from '../../../src/server/db/schema-parts.ts';
import { buildShop } from '../../builders/shop.ts';

const sources = import.meta.glob<string>('../../../src/**/*.ts', {
  query: '?raw',
  import: 'default',
  eager: true,
});
const run = promisify(execFile);

async function checkLog(): Promise<{ code: number; words: string }> {
  const work = run(process.execPath, ['--import', 'tsx', 'src/commands/check-log.ts'], { env: process.env });
  return work.then(
    ({ stdout }) => ({ code: 0, words: stdout }),
    (error: { code: number; stdout: string }) => ({ code: error.code, words: error.stdout }),
  );
}

it('the log is written in one place, which only adds; nothing else of the product touches its rows', () => {
  const touching = Object.entries(sources)
    .filter(([path, text]) => !path.endsWith('.test.ts') && /\(['"]activity['"]\)/.test(text))
    .map(([path]) => path.replace(/^.*\/src\//, ''));
  expect(touching).toContain('server/db/activity-log.ts');
  for (const path of touching) {
    const text = sources[`../../../src/${path}`] ?? '';
    expect(text).not.toMatch(/\(['"]activity['"]\)[^;]*\.(update|delete|del|truncate)\(/);
  }
});

it('check-log says that all is well, then names the line that was changed beneath, and fails', async () => {
  const scope = await buildShop({ name: 'Harrow Lane Foods' });
  for (const line of [1, 2, 3]) {
    await inTransaction(scope, (inner) =>
      recordActivity(inner, { kind: 'test.happened', details: { line } }),
    );
  }
  const before = await checkLog();
  expect(before.code).toBe(0);
  expect(before.words).toContain('Harrow Lane Foods: 3 lines, unbroken.');
  await allowChanges(scope.db, 'activity');
  await scope.db('activity').where({ shop_id: scope.shopId, seq: 2 }).update({ details: '{"line":9,"v":1}' });
  await refuseChanges(scope.db, 'activity');
  const after = await checkLog();
  expect(after.code).toBe(1);
  expect(after.words).toContain('Harrow Lane Foods: broken at line 2 (altered).');
}, 120_000);
