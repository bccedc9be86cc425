import type { ShopScope } from '../../src/server/db/scope.ts';
import { buildRunningTrial } from '../builders/measured-trial.ts';
import { findPersonOf, openAppDatabase } from './app-database.ts';

/** Puts a trial that has just been started into the database of a running app, as Dana's; answers its id. */
export async function addRunningTrial(app: { dataDir: string }): Promise<string> {
  const db = openAppDatabase(app);
  try {
    const { id, shopId } = await findPersonOf(db, 'dana@harrowlane.example');
    const scope: ShopScope = { db, shopId, actor: { kind: 'person', id } };
    const operator = await db('person_roles').where({ shop_id: shopId, role: 'operator' }).first('person_id');
    return await buildRunningTrial(scope, {
      ownerId: id,
      personId: String(operator?.['person_id']),
      answers: {
        measuring: { who: 'operator', when: 'atOnce', partsPerRun: '2' },
        watch: {
          results: [{ id: 'burnt', name: 'burnt edges', wish: 'less', kind: 'rejects', lotSize: '50' }],
        },
      },
    });
  } finally {
    await db.destroy();
  }
}
