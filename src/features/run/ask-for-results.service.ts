import { DateTime } from 'luxon';
import { now } from '../../server/clock.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { findAddressee } from '../message/addressee.repository.ts';
import { readConversation } from '../message/conversation.repository.ts';
import { updateRun } from './run.repository.ts';
import type { Run } from './run.ts';
import { readTimeZone, takesTexts } from './run-people.service.ts';
import { askFor } from './run-words.ts';
import type { RunningTrial } from './running-trial.ts';
import { talkOf, tell } from './tell.service.ts';
import { missingItems } from './text-figures.service.ts';

const minute = 60_000;

/**
 * Asks whoever measures for the numbers of a run that is made: once they can be there. Call it in a transaction.
 */
export async function askForResults(scope: ShopScope, trial: RunningTrial, run: Run): Promise<void> {
  const [item] = await missingItems(scope, trial, run.id);
  if (!item || run.measurerId === null) return;
  const dueAt = await resultMoment(scope, trial, run);
  await updateRun(scope, { id: run.id, from: ['made'] }, { remindAt: dueAt + trial.remindMinutes * minute });
  const person = await findAddressee(scope, run.measurerId);
  if (person === null || !takesTexts(trial, person)) return;
  const { state } = await readConversation(scope, person.personId);
  // From here on a number from this phone is a result, no longer practice.
  if (state === 'practice') await talkOf(scope, person.personId, 'idle');
  const ask = askFor(item);
  const params = {
    machine: trial.machine,
    run: run.number,
    label: run.label ?? '',
    // Several runs may wait for their numbers on one phone, so the example names the run.
    ask: { ...ask, example: `${run.number}: ${ask.example}` },
  };
  const about = { trialId: trial.id, runId: run.id, because: `${run.id}:${run.madeAt}`, notBefore: dueAt };
  await tell(scope, person.personId, { template: 'resultsWanted', params }, about);
}

/** When the numbers can be there: at once, after the minutes that were said, or the next morning. */
async function resultMoment(scope: ShopScope, trial: RunningTrial, run: Run): Promise<number> {
  const madeAt = run.madeAt ?? now();
  if (trial.resultMinutes !== null) return madeAt + trial.resultMinutes * minute;
  if (!trial.resultsNextDay) return now();
  const zone = await readTimeZone(scope);
  const morning = DateTime.fromMillis(madeAt, { zone })
    .plus({ days: 1 })
    .set({ hour: 6, minute: 0, second: 0, millisecond: 0 });
  return morning.toMillis();
}
