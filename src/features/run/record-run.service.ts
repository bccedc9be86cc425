import { now } from '../../server/clock.ts';
import { recordActivity } from '../../server/db/activity-log.ts';
import { inTransaction } from '../../server/db/in-transaction.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { AppError } from '../../server/errors.ts';
import { closeIfLastRun } from './close-trial.service.ts';
import {
  keepEndWithoutFigure,
  keepFigures,
  logFigures,
  requireSoundFigures,
  type Submission,
  standing,
} from './keep-figures.service.ts';
import { cancelUnsentPrompts } from './prompts.repository.ts';
import { hasSubmission, listReadings } from './readings.repository.ts';
import { listResultItems, missingParts } from './result-items.ts';
import type { Figure, Run, RunEnd } from './run.ts';
import {
  findRunOf,
  requireBeingRun,
  requirePlan,
  requireRunStep,
  takeRunStep,
} from './run-reader.service.ts';
import type { RunEvent } from './run-states.ts';
import { findStretch } from './stretch.repository.ts';

export interface RecordRun extends Submission {
  runId: string;
  /** Left out where the sender has not seen the run's row: a text. */
  revision?: number | undefined;
  /** Empty where the run ended without one. */
  figures: readonly Figure[];
  end: Exclude<RunEnd, 'notRun'>;
  /** No more figures are coming: what is there counts. */
  isAll?: boolean;
  /** Far from plausible: kept, but asked back before it counts. */
  isDoubted?: boolean;
}

export interface Recorded {
  run: Run;
  /** What is still to come, by result. */
  missing: { result: number; missing: number }[];
  /** This very submission was there before; nothing was changed. */
  already: boolean;
}

function eventOf(wish: RecordRun, missing: number): RunEvent {
  if (wish.isDoubted) return 'doubt';
  return missing > 0 ? 'record part' : 'record';
}

/** Keeps what came in. @returns the figures that count, and what is still to come */
async function keep(scope: ShopScope, run: Run, wish: RecordRun) {
  const items = listResultItems((await requirePlan(scope, run.trialId)).brief);
  const before = await listReadings(scope, [run.id]);
  const { submission, source, inboxTextId, enteredBy, reason } = wish;
  const sent = { submission, source, enteredBy, inboxTextId: inboxTextId ?? null, reason: reason ?? null };
  if (wish.end !== 'measured') {
    await keepEndWithoutFigure(scope, { runId: run.id, before }, sent);
    return { before, figures: [], missing: [] };
  }
  requireSoundFigures(items, wish.figures);
  const state = wish.isDoubted ? 'asked back' : 'counts';
  const about = { runId: run.id, items, before, figures: wish.figures, state } as const;
  const figures = await keepFigures(scope, about, sent);
  if (!figures.some(({ result }) => result === 0) && wish.isAll) {
    throw new AppError('invalid', { fields: [{ pointer: '#/figures', code: 'missing' }] });
  }
  const missing = missingParts(items, figures);
  return { before, figures, missing: wish.isAll ? [] : missing };
}

/**
 * Records what a run gave: figures by result and part, or that it failed or went beyond the gauge. With every figure in
 * it is done, else it stays open.
 * @throws AppError `invalid` naming the figures, `not-found`, `not-now`, `changed-meanwhile`
 */
export function recordRun(scope: ShopScope, wish: RecordRun): Promise<Recorded> {
  return inTransaction(scope, async (inner) => {
    const run = await findRunOf(inner, wish.runId);
    if (await hasSubmission(inner, run.id, wish.submission)) return { run, missing: [], already: true };
    await requireBeingRun(inner, run);
    if (wish.end === 'measured' && wish.figures.length === 0 && !wish.isAll) {
      throw new AppError('invalid', { fields: [{ pointer: '#/figures', code: 'missing' }] });
    }
    const { before, figures, missing } = await keep(inner, run, wish);
    const step = requireRunStep(run, eventOf(wish, missing.length));
    const isDone = step.to === 'done';
    const at = now();
    await takeRunStep(inner, run, step, {
      // Whoever typed saw a run without figures; that its text went out meanwhile takes nothing from what they typed.
      revision: before.length > 0 ? wish.revision : undefined,
      madeAt: run.madeAt ?? at,
      measuredAt: at,
      stretchId: run.stretchId ?? (await findStretch(inner, run.trialId)),
      ...(isDone ? { end: wish.end, closedAt: at, remindAt: null } : {}),
    });
    if (isDone) await cancelUnsentPrompts(inner, { trialId: run.trialId, runId: run.id });
    await recordActivity(inner, {
      kind: 'run.recorded',
      subjectId: run.id,
      trialId: run.trialId,
      details: {
        run: run.number,
        end: isDone ? wish.end : null,
        source: wish.source,
        before: logFigures(standing(before)),
        after: logFigures(figures),
      },
    });
    if (isDone) await closeIfLastRun(inner, run.trialId);
    return { run: await findRunOf(inner, run.id), missing, already: false };
  });
}
