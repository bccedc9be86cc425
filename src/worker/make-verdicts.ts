import { workerScope } from '../features/message/sending.service.ts';
import { makeVerdict } from '../features/verdict/make-verdict.service.ts';
import { listTrialsToJudge } from '../features/verdict/verdict.repository.ts';
import { describeError, log } from '../server/log.ts';
import type { Job } from './loop.ts';

const trialsAtOnce = 10;

/** Judges trials whose readings are in. Two workers at once do no harm: a verdict is kept once for its readings. */
export const makeVerdicts: Job = {
  name: 'make-verdicts',
  everyMilliseconds: 2_000,
  async run({ db, stopping }) {
    let made = 0;
    for (const { shopId, trialId } of await listTrialsToJudge(db, trialsAtOnce)) {
      if (stopping()) break;
      try {
        if (await makeVerdict(workerScope(db, shopId), trialId)) made += 1;
      } catch (error) {
        // One trial that cannot be judged must not keep the others waiting.
        log.error({ event: 'verdict-not-made', shopId, trialId, error: describeError(error) });
      }
    }
    return made;
  },
};
