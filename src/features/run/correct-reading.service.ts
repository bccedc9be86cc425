import { now } from '../../server/clock.ts';
import { recordActivity } from '../../server/db/activity-log.ts';
import { inTransaction } from '../../server/db/in-transaction.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { AppError } from '../../server/errors.ts';
import { findTrialOf } from '../trial/trial-reader.service.ts';
import {
  keepEndWithoutFigure,
  keepFigures,
  logFigures,
  requireSoundFigures,
  type Submission,
  standing,
} from './keep-figures.service.ts';
import { hasSubmission, listReadings } from './readings.repository.ts';
import { reopenVerdict } from './reopen-verdict.service.ts';
import { listResultItems } from './result-items.ts';
import type { Figure, RunEnd } from './run.ts';
import { findRunOf, requirePlan, requireRunStep, takeRunStep } from './run-reader.service.ts';

export interface CorrectReading extends Submission {
  runId: string;
  revision?: number | undefined;
  /** The right figures; parts that are not named stay as they were. */
  figures: readonly Figure[];
  end: Exclude<RunEnd, 'notRun'>;
}

/**
 * Puts the right figures in the place of those of a run that is done; the old ones stay on record. Once the readings are
 * in, the next verdict is made from them.
 * @throws AppError `invalid` naming the figures, `not-found`, `not-now`, `changed-meanwhile`
 */
export function correctReading(scope: ShopScope, wish: CorrectReading): Promise<void> {
  return inTransaction(scope, async (inner) => {
    const run = await findRunOf(inner, wish.runId);
    if (await hasSubmission(inner, run.id, wish.submission)) return;
    const step = requireRunStep(run, 'correct');
    const items = listResultItems((await requirePlan(inner, run.trialId)).brief);
    const before = await listReadings(inner, [run.id]);
    const { submission, source, enteredBy, inboxTextId = null, reason = null } = wish;
    const sent = { submission, source, enteredBy, inboxTextId, reason };
    let after: Figure[] = [];
    if (wish.end === 'measured') {
      requireSoundFigures(items, wish.figures);
      const about = { runId: run.id, items, before, figures: wish.figures, state: 'counts' } as const;
      after = await keepFigures(inner, about, sent);
      const isSaid = wish.figures.length > 0 && after.some(({ result }) => result === 0);
      if (!isSaid) throw new AppError('invalid', { fields: [{ pointer: '#/figures', code: 'missing' }] });
    } else {
      await keepEndWithoutFigure(inner, { runId: run.id, before }, sent);
    }
    await takeRunStep(inner, run, step, { revision: wish.revision, end: wish.end, measuredAt: now() });
    await recordActivity(inner, {
      kind: 'reading.corrected',
      subjectId: run.id,
      trialId: run.trialId,
      details: {
        run: run.number,
        source,
        end: [run.end, wish.end],
        before: logFigures(standing(before)),
        after: logFigures(after),
      },
    });
    await reopenVerdict(inner, await findTrialOf(inner, run.trialId));
  });
}
