import { recordActivity } from '../../server/db/activity-log.ts';
import { inTransaction } from '../../server/db/in-transaction.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { AppError } from '../../server/errors.ts';
import { announceHandOver } from './announce-hand-over.service.ts';
import { isActivePerson } from './run-people.repository.ts';
import { findRunOf, requireBeingRun, requireRunStep, takeRunStep } from './run-reader.service.ts';

/**
 * Gives a run to somebody else: to make where it is not made yet, else to measure.
 * @throws AppError `invalid` for somebody who is not on the crew, `not-found`, `not-now`, `changed-meanwhile`
 */
export function handOverRun(
  scope: ShopScope,
  which: { runId: string; revision?: number | undefined; personId: string },
): Promise<void> {
  const { personId, revision } = which;
  return inTransaction(scope, async (inner) => {
    const run = await findRunOf(inner, which.runId);
    const trial = await requireBeingRun(inner, run);
    const step = requireRunStep(run, 'hand over');
    if (!(await isActivePerson(inner, personId))) {
      throw new AppError('invalid', { fields: [{ pointer: '#/personId', code: 'person-gone' }] });
    }
    const isMade = step.from === 'made';
    const before = isMade ? (run.measurerId ?? run.personId) : run.personId;
    const change = isMade ? { measurerId: personId } : { personId, askedAt: null };
    await takeRunStep(inner, run, step, { revision, ...change, remindAt: null });
    await announceHandOver(inner, { trial, run, before, after: personId });
    await recordActivity(inner, {
      kind: 'run.handed-over',
      subjectId: run.id,
      trialId: run.trialId,
      details: { run: run.number, to: isMade ? 'measure' : 'make', before, after: personId },
    });
  });
}
