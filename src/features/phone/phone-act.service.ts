import { now } from '../../server/clock.ts';
import { inTransaction } from '../../server/db/in-transaction.ts';
import { AppError } from '../../server/errors.ts';
import { newId } from '../../server/ids.ts';
import { wakeWorker } from '../../server/wake.ts';
import { findAddressee } from '../message/addressee.repository.ts';
import { remindLater, reportCannotReach } from '../run/cannot-reach.service.ts';
import { confirmReading } from '../run/confirm-reading.service.ts';
import { holdTrial } from '../run/hold-trial.service.ts';
import { makeRun } from '../run/make-run.service.ts';
import { raiseProblem } from '../run/problem.service.ts';
import { recordRun } from '../run/record-run.service.ts';
import { listResultItems } from '../run/result-items.ts';
import { listRuns } from '../run/run.repository.ts';
import type { Run } from '../run/run.ts';
import { requirePlan } from '../run/run-reader.service.ts';
import { readRunningTrial } from '../run/running-trial.service.ts';
import { skipRun } from '../run/skip-run.service.ts';
import { talkOf } from '../run/tell.service.ts';
import { looksOdd } from '../run/text-figures.service.ts';
import { type PhoneForm, readTypedFigures } from './phone-form.schema.ts';
import { openPhone, type PhoneVisit } from './phone-link.service.ts';
import type { PhoneOutcome } from './phone-outcome.ts';
import { findOwnRun } from './phone-page.service.ts';

type Opened = Awaited<ReturnType<typeof openPhone>>;

async function record(
  opened: Opened,
  run: Run,
  form: PhoneForm,
  typed: Readonly<Record<string, string>>,
): Promise<PhoneOutcome> {
  const { scope, personId } = opened;
  const items = listResultItems((await requirePlan(scope, run.trialId)).brief);
  const { figures, faults } = readTypedFigures(items, typed);
  if (faults.length > 0) {
    throw new AppError('invalid', {
      fields: faults.map((name) => ({ pointer: `#/${name}`, code: 'not-a-number' })),
    });
  }
  return inTransaction(scope, async (inner): Promise<PhoneOutcome> => {
    // As by text: far from anything plausible is asked back once, and never a second time.
    const trial = await readRunningTrial(inner, run.trialId);
    const isDoubted = run.state !== 'doubtful' && (await looksOdd(inner, trial, figures));
    const { missing, already } = await recordRun(inner, {
      ...{ runId: run.id, figures, isDoubted, submission: form.submission, enteredBy: personId },
      end: 'measured',
      source: 'phone page',
    });
    if (already) return 'saved';
    if (isDoubted) {
      await talkOf(inner, personId, 'sure', { runId: run.id });
      return 'odd';
    }
    return missing.length > 0 ? 'more' : 'saved';
  });
}

/** How far a setting got, to whoever is called; the run waits for an answer. */
function cannotReach({ scope, personId }: Opened, run: Run, form: PhoneForm): Promise<PhoneOutcome> {
  if (form.words === '') throw new AppError('invalid', { fields: [{ pointer: '#/words', code: 'missing' }] });
  return inTransaction(scope, async (inner): Promise<PhoneOutcome> => {
    const trial = await readRunningTrial(inner, run.trialId);
    const name = (await findAddressee(inner, personId))?.name ?? '';
    const { submission: id, words } = form;
    await reportCannotReach(inner, { trial, run }, { id, words, actual: words, by: { personId, name } });
    return 'asked';
  });
}

/** The reminder moves, as with LATER by text. */
function putOff({ scope }: Opened, run: Run): Promise<PhoneOutcome> {
  return inTransaction(scope, async (inner): Promise<PhoneOutcome> => {
    const { remindMinutes } = await readRunningTrial(inner, run.trialId);
    await remindLater(inner, run, now() + remindMinutes * 60_000);
    return 'later';
  });
}

async function actOnRun(
  opened: Opened,
  run: Run,
  form: PhoneForm,
  typed: Readonly<Record<string, string>>,
): Promise<PhoneOutcome> {
  const { scope, personId, trialId } = opened;
  switch (form.action) {
    case 'send':
      return record(opened, run, form, typed);
    case 'made':
      await makeRun(scope, { runId: run.id });
      return 'made';
    case 'right':
      await confirmReading(scope, { runId: run.id, isRight: true });
      return 'saved';
    case 'later':
      return putOff(opened, run);
    case 'cannot':
      return cannotReach(opened, run, form);
    case 'skip':
      await skipRun(scope, { runId: run.id });
      return 'skipped';
    default: {
      const problem = { trialId, runId: run.id, words: form.words, raisedBy: personId };
      await raiseProblem(scope, { ...problem, id: form.submission });
      return 'told';
    }
  }
}

/**
 * Does what was pressed on a phone page, for that person's own run only. DANGER holds the trial whatever run is in hand.
 * A page that is behind does nothing and says so.
 * @throws AppError `gone`, `too-many`, `invalid` naming the fields
 */
export async function actOnPhone(
  visit: PhoneVisit,
  form: PhoneForm,
  typed: Readonly<Record<string, string>>,
): Promise<PhoneOutcome> {
  const opened = await openPhone(visit);
  const { scope, trialId, personId } = opened;
  if (form.action === 'danger') {
    await holdTrial(scope, trialId);
    await raiseProblem(scope, { id: newId(), trialId, runId: null, words: 'DANGER', raisedBy: personId });
    wakeWorker();
    return 'stopped';
  }
  const run = findOwnRun(await listRuns(scope, trialId), personId);
  if (run === null || run.id !== form.run) return 'behind';
  try {
    const outcome = await actOnRun(opened, run, form, typed);
    wakeWorker();
    return outcome;
  } catch (error) {
    const isBehind =
      error instanceof AppError && (error.code === 'not-now' || error.code === 'changed-meanwhile');
    if (isBehind) return 'behind';
    throw error;
  }
}
