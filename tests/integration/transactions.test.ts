import { execFile } from 'node:child_process';
import { fileURLToPath } from 'node:url';
import { promisify } from 'node:util';
import { describe, expect, it } from 'vitest';
import { database } from '../../src/server/db/connection.ts';
import { inTransaction } from '../../src/server/db/in-transaction.ts';
import { config } from '../../src/server/env.ts';

const script = fileURLToPath(new URL('read-then-write.ts', import.meta.url));

async function countInAnotherProcess(rounds: number): Promise<{ failed: number }> {
  const { database: at } = config();
  const file = at.kind === 'sqlite' ? at.file : '';
  const { stdout } = await promisify(execFile)(process.execPath, [
    '--import',
    'tsx',
    script,
    file,
    String(rounds),
  ]);
  return JSON.parse(stdout);
}

describe('transactions', () => {
  it('lets two processes read and then write 500 times each, and loses none', {
    timeout: 120_000,
  }, async () => {
    await database()('app_state').insert({ key: 'counter', value: '0' });
    const outcomes = await Promise.all([countInAnotherProcess(500), countInAnotherProcess(500)]);
    expect(outcomes).toEqual([{ failed: 0 }, { failed: 0 }]);
    expect(await database()('app_state').where({ key: 'counter' }).first('value')).toEqual({ value: '1000' });
  });

  it('joins the transaction that is already open', async () => {
    const db = database();
    const failing = inTransaction({ db }, async (outer) => {
      await inTransaction(outer, ({ db: inner }) => inner('app_state').insert({ key: 'inner', value: 'x' }));
      throw new Error('outer failed');
    });
    await expect(failing).rejects.toThrow('outer failed');
    expect(await db('app_state').where({ key: 'inner' })).toEqual([]);
  });

  it('runs transactions of one process one after the other', async () => {
    const db = database();
    await db('app_state').insert({ key: 'own', value: '0' });
    await Promise.all(
      Array.from({ length: 50 }, () =>
        inTransaction({ db }, async ({ db: transaction }) => {
          const { value } = await transaction('app_state').where({ key: 'own' }).first('value');
          await transaction('app_state')
            .where({ key: 'own' })
            .update({ value: String(Number(value) + 1) });
        }),
      ),
    );
    expect(await db('app_state').where({ key: 'own' }).first('value')).toEqual({ value: '50' });
  });
});
