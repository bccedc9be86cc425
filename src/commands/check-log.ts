import { checkAllChains } from '../server/db/activity-log.ts';
import { closeDatabase, database } from '../server/db/connection.ts';

// `npm run check-log`: walks the activity log of every shop and names the first line that was altered or taken away.
const findings = await checkAllChains(database());
await closeDatabase();
for (const { shop, finding } of findings) {
  const words = finding.intact
    ? `${finding.lines} lines, unbroken.`
    : `broken at line ${finding.seq} (${finding.reason}).`;
  console.log(`${shop}: ${words}`);
}
process.exitCode = findings.every(({ finding }) => finding.intact) ? 0 : 1;
