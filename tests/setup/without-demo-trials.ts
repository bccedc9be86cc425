import { allowChanges, refuseChanges } from '../../src/server/db/schema-parts.ts';
import { openAppDatabase } from './app-database.ts';

const tables = ['readings', 'runs', 'stretches', 'verdicts', 'plans', 'answers'] as const;

/** Takes the trials of the demo shop out of a running app's data, for tests of a shop that has none yet. */
export async function withoutDemoTrials(app: { dataDir: string }): Promise<void> {
  const db = openAppDatabase(app);
  try {
    await db.transaction(async (transaction) => {
      for (const guarded of ['verdicts', 'answers']) await allowChanges(transaction, guarded);
      await transaction('messages').whereNotNull('trial_id').delete();
      for (const table of tables) await transaction(table).delete();
      await transaction('trials').delete();
      await refuseChanges(transaction, 'verdicts');
      await refuseChanges(transaction, 'answers', 'frozen_hash');
    });
  } finally {
    await db.destroy();
  }
}
