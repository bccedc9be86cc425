import {
  closeInboxText,
  countReadingAttempt,
  type InboxText,
  listNewInboxTexts,
} from '../features/message/inbox.repository.ts';
import { readInboxText } from '../features/message/inbox.service.ts';
import { workerScope } from '../features/message/sending.service.ts';
import { converse } from '../features/run/converse.service.ts';
import { holdRunsOfOptOut } from '../features/run/hold-by-text.service.ts';
import { describeError, log } from '../server/log.ts';
import { holdLease } from './lease.ts';
import type { Job, JobContext } from './loop.ts';

const textsAtOnce = 50;
const leaseMilliseconds = 3_000;
/** A text that cannot be read after so many tries is set aside, so that the sender's later ones are heard. */
const mostAttempts = 5;

/** Reads texts in the order the service had them, one worker at a time. */
export const readInbox: Job = {
  name: 'read-inbox',
  everyMilliseconds: 500,
  async run(context) {
    const heldUp = new Set<string>();
    let done = 0;
    for (const text of await listNewInboxTexts(context.db, textsAtOnce)) {
      // Renewed with each text: short, so that after a restart nobody waits long for the lease of the one before.
      if (context.stopping() || !(await holdLease(context, 'read-inbox', leaseMilliseconds))) break;
      // The order of one person's texts holds: after one that failed, the rest of theirs wait.
      if (text.personId !== null && heldUp.has(text.personId)) continue;
      if (await tryReading(context, text)) done += 1;
      else if (text.personId !== null) heldUp.add(text.personId);
    }
    return done;
  },
};

async function tryReading({ db }: JobContext, text: InboxText): Promise<boolean> {
  const scope = workerScope(db, text.shopId);
  try {
    await readInboxText(scope, text, { converse, holdRunsOfOptOut });
    return true;
  } catch (error) {
    log.error({ event: 'text-not-read', shopId: text.shopId, error: describeError(error) });
    await countReadingAttempt(scope, text.id);
    if (text.attempts + 1 < mostAttempts) return false;
    await closeInboxText(scope, text.id, { state: 'set aside', intent: null });
    return true;
  }
}
