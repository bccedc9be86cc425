import { rolesMay } from '../../server/auth/permissions.ts';
import { inTransaction } from '../../server/db/in-transaction.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { AppError } from '../../server/errors.ts';
import type { TrialReader } from '../trial/trial-reader.service.ts';
import { confirmReading } from './confirm-reading.service.ts';
import { correctReading } from './correct-reading.service.ts';
import { handOverRun } from './hand-over.service.ts';
import { makeRun } from './make-run.service.ts';
import { noteRun } from './note-run.service.ts';
import { recordRun } from './record-run.service.ts';
import { repeatRun } from './repeat-run.service.ts';
import type { Run } from './run.ts';
import type { RunAnswer, RunEventBody } from './run-event.schema.ts';
import { findRunOf } from './run-reader.service.ts';
import { type RunActor, type RunEvent, runEventsOpenTo, runSteps } from './run-states.ts';
import { sendNow } from './send-now.service.ts';
import { setActual } from './set-actual.service.ts';
import { putBackRun, skipRun } from './skip-run.service.ts';

type BodyOf<Event extends RunEventBody['event']> = Extract<RunEventBody, { event: Event }>;
type Handler<Event extends RunEventBody['event']> = (
  scope: ShopScope,
  wish: { runId: string } & BodyOf<Event>,
  reader: TrialReader,
) => Promise<Pick<RunAnswer, 'missing'> | undefined>;

const nothingMissing = { missing: [] };

/** Each event with what carries it out. The services themselves also serve texts and the phone page. */
const handlers: { [Event in RunEventBody['event']]: Handler<Event> } = {
  record: (scope, wish, { personId }) => recordRun(scope, { ...wish, enteredBy: personId }),
  async correct(scope, wish, { personId }) {
    await correctReading(scope, { ...wish, source: 'board', enteredBy: personId });
    return nothingMissing;
  },
  make: (scope, wish) => makeRun(scope, wish).then(() => nothingMissing),
  confirm: (scope, wish) => confirmReading(scope, { ...wish, isRight: true }).then(() => nothingMissing),
  deny: (scope, wish) => confirmReading(scope, { ...wish, isRight: false }).then(() => nothingMissing),
  skip: (scope, wish) => skipRun(scope, wish).then(() => nothingMissing),
  'put back': (scope, wish, reader) => putBackRun(scope, wish, reader).then(() => nothingMissing),
  repeat: (scope, wish, reader) => repeatRun(scope, wish, reader).then(() => nothingMissing),
  'send now': (scope, wish) => sendNow(scope, wish).then(() => nothingMissing),
  'hand over': (scope, wish) => handOverRun(scope, wish).then(() => nothingMissing),
  note: (scope, wish, { personId }) => noteRun(scope, { ...wish, by: personId }).then(() => nothingMissing),
  'set actual': (scope, wish) => setActual(scope, wish).then(() => nothingMissing),
};

/** Whether this reader is one of those who may: `run.record.own` is for whoever makes or measures that very run. */
function isActor(reader: TrialReader, run: Run, actor: RunActor): boolean {
  if (actor === 'product' || !rolesMay(reader.roles, actor)) return false;
  const isOwn = run.personId === reader.personId || run.measurerId === reader.personId;
  return actor !== 'run.record.own' || isOwn;
}

/** What this reader may do with a run now. */
export function eventsOfReader(run: Run, reader: TrialReader): RunEvent[] {
  return runEventsOpenTo(run.state, (actor) => isActor(reader, run, actor));
}

function requireActor(run: Run, event: RunEvent, reader: TrialReader): void {
  const may = runSteps.some(
    (step) => step.event === event && step.by.some((actor) => isActor(reader, run, actor)),
  );
  if (!may) throw new AppError('forbidden', { detail: `may not ${event} a run` });
}

/**
 * Carries out what a person does to a run on the board.
 * @throws AppError `not-found`, `forbidden`, `not-now`, `changed-meanwhile` with what the run is now, and what the event
 * itself refuses
 */
export function carryOutRunEvent(
  scope: ShopScope,
  about: { runId: string; body: RunEventBody },
  reader: TrialReader,
): Promise<RunAnswer> {
  const { runId, body } = about;
  return inTransaction(scope, async (inner) => {
    requireActor(await findRunOf(inner, runId), body.event, reader);
    const handle = handlers[body.event] as Handler<RunEventBody['event']>;
    const { missing } = (await handle(inner, { runId, ...body }, reader)) ?? nothingMissing;
    const { id, state, end, revision } = await findRunOf(inner, runId);
    return { id, state, end, revision, missing };
  });
}
