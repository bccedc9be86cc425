import { checkAllChains } from '../server/db/activity-log.ts';
import { writeAppState } from '../server/db/app-state.ts';
import { log } from '../server/log.ts';
import { daily } from './daily.ts';

/** Once a day: walks every shop's activity log, and says loudly where a line was altered or taken away. */
export const checkLog = daily('check-log', async ({ db }) => {
  let isIntact = true;
  for (const { finding } of await checkAllChains(db)) {
    if (finding.intact) continue;
    isIntact = false;
    log.error({ event: 'activity-log-broken', code: finding.reason, count: finding.seq });
  }
  await writeAppState(db, 'log-check', isIntact ? 'intact' : 'broken');
});
