import { checkActivityChain } from '../server/db/activity-log.ts';
import { closeDatabase, database } from '../server/db/connection.ts';

// `npm run check-log`: walks the activity log of every shop and names the first line that was altered or taken away.
const shops: { id: string; name: string }[] = await database()('shops').orderBy('name').select('id', 'name');
let broken = 0;
for (const shop of shops) {
  const finding = await checkActivityChain({ db: database(), shopId: shop.id });
  if (finding.intact) {
    console.log(`${shop.name}: ${finding.lines} lines, unbroken.`);
    continue;
  }
  broken += 1;
  console.log(`${shop.name}: broken at line ${finding.seq} (${finding.reason}).`);
}
await closeDatabase();
process.exitCode = broken === 0 ? 0 : 1;
