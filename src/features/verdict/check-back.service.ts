import { recordActivity } from '../../server/db/activity-log.ts';
import { inTransaction } from '../../server/db/in-transaction.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { AppError } from '../../server/errors.ts';
import { findTrialOf, type TrialReader } from '../trial/trial-reader.service.ts';
import type { CheckBack } from './check-back.schema.ts';
import { findLatestVerdict } from './decide.service.ts';
import { insertDecision, listDecisions } from './decision.repository.ts';
import { isAdopted } from './decision.ts';
import { cancelCheckBacks } from './sign-off.repository.ts';

/**
 * Keeps whether settings that are in use hold. An answer before the week is over spares the question.
 * @throws AppError `not-found`; `not-now` where no new settings are in use
 */
export function answerCheckBack(
  scope: ShopScope,
  which: CheckBack & { trialId: string },
  reader: TrialReader,
): Promise<void> {
  return inTransaction(scope, async (inner) => {
    const trial = await findTrialOf(inner, which.trialId);
    if (trial.state !== 'closed' || !isAdopted(await listDecisions(inner, trial.id)))
      throw new AppError('not-now', { detail: 'no new settings are in use' });
    const verdict = await findLatestVerdict(inner, trial.id);
    await insertDecision(inner, {
      trialId: trial.id,
      verdictId: verdict.id,
      outcome: which.holds ? 'holds' : 'does not hold',
      settings: [],
      note: which.note,
      decidedBy: reader.personId,
    });
    await cancelCheckBacks(inner, trial.id);
    await recordActivity(inner, {
      kind: 'trial.checked-back',
      subjectId: trial.id,
      trialId: trial.id,
      details: { holds: which.holds },
    });
  });
}
