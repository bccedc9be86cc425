import { now } from '../../server/clock.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { findAddressee } from '../message/addressee.repository.ts';
import type { Trial } from '../trial/trial.ts';
import { cancelUnsentPrompts } from './prompts.repository.ts';
import type { Run } from './run.ts';
import { findCaller, takesTexts } from './run-people.service.ts';
import { writeUsualSettings } from './run-words.ts';
import { readRunningTrial } from './running-trial.service.ts';
import { noteSetBack } from './set-back.repository.ts';
import { tell } from './tell.service.ts';

/** How a trial came to its end: every run is closed, or somebody ended it early. */
export type TrialEnd = 'all in' | 'early';

/** What came in last is said first: it is queued after this, in the same moment. */
const afterTheLastWord = 1_000;

/**
 * What the end of the making sends out, in the transaction at hand: whatever still asks for a run is cancelled, whoever
 * was at the machine last is asked to put the usual settings back, and whoever is called hears that all is in.
 */
export async function announceEnd(
  scope: ShopScope,
  about: { trial: Trial; runs: readonly Run[]; how: TrialEnd },
): Promise<void> {
  const { runs, how } = about;
  const trialId = about.trial.id;
  await cancelUnsentPrompts(scope, { trialId });
  const trial = await readRunningTrial(scope, trialId);
  const because = `${trialId}:${trial.revision}`;
  const { machine, title } = trial;
  if (how === 'all in') {
    const caller = await findCaller(scope, trial);
    const params = { title, runs: runs.length };
    if (caller.personId !== null)
      await tell(scope, caller.personId, { template: 'allIn', params }, { trialId, because });
  }
  const last = lastAtMachine(runs);
  if (last === undefined) return;
  await noteSetBack(scope, trialId, 'asked');
  const person = last.personId === null ? null : await findAddressee(scope, last.personId);
  if (person === null || !takesTexts(trial, person)) return;
  const settings = writeUsualSettings(trial);
  const wish = { trialId, because, notBefore: now() + afterTheLastWord };
  if (how === 'early') {
    await tell(scope, person.personId, { template: 'endedEarly', params: { machine, settings } }, wish);
  } else {
    const params = { machine, settings, runs: runs.length };
    await tell(scope, person.personId, { template: 'backToUsual', params }, wish);
  }
}

/** The run that was set on the machine last, by whoever; undefined where nothing was asked or made. */
function lastAtMachine(runs: readonly Run[]): Run | undefined {
  const touched = (run: Run) => Math.max(run.askedAt ?? 0, run.madeAt ?? 0);
  return runs.filter((run) => touched(run) > 0).sort((one, other) => touched(other) - touched(one))[0];
}
