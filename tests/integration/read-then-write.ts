// Run by `transactions.test.ts` as a process of its own: many transactions that read a counter and then write it.
import { openDatabase } from '../../src/server/db/connection.ts';
import { inTransaction } from '../../src/server/db/in-transaction.ts';

const [file = '', rounds = '0'] = process.argv.slice(2);
const db = openDatabase({ kind: 'sqlite', file });
let failed = 0;
for (let round = 0; round < Number(rounds); round += 1) {
  try {
    await inTransaction({ db }, async ({ db: transaction }) => {
      const { value } = await transaction('app_state').where({ key: 'counter' }).first('value');
      await transaction('app_state')
        .where({ key: 'counter' })
        .update({ value: String(Number(value) + 1) });
    });
  } catch {
    failed += 1;
  }
}
await db.destroy();
process.stdout.write(JSON.stringify({ failed }));
