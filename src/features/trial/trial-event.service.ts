import { inTransaction } from '../../server/db/in-transaction.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { addRunAs } from '../run/add-run.service.ts';
import { confirmSetBackAs } from '../run/back-to-usual.service.ts';
import { endEarly } from '../run/end-early.service.ts';
import { holdTrialAs } from '../run/hold-trial.service.ts';
import { pauseTrial } from '../run/pause-trial.service.ts';
import { raiseProblemAs, sayChange, settleProblem } from '../run/problem.service.ts';
import { resumeTrial } from '../run/resume-trial.service.ts';
import { askVerdictAgain } from '../verdict/ask-sign-off.service.ts';
import { planChecks } from '../verdict/check-runs.service.ts';
import { adopt, leaveAsIs, openAgain } from '../verdict/decide.service.ts';
import { sendForReview } from './review.service.ts';
import { startTrial } from './start.service.ts';
import type { TrialEventBody } from './trial.schema.ts';
import type { Trial } from './trial.ts';
import { findTrialOf, type TrialReader } from './trial-reader.service.ts';

type BodyOf<Event extends TrialEventBody['event']> = Extract<TrialEventBody, { event: Event }>;

/** What an event does, in one transaction. It asks the table of states whether it may, and takes the step itself. */
type Handler<Event extends TrialEventBody['event']> = (
  scope: ShopScope,
  which: { trial: Trial } & BodyOf<Event>,
  reader: TrialReader,
) => Promise<void>;

/** Events of a running trial join here, with their body in `trialEventSchema`. */
const handlers: { [Event in TrialEventBody['event']]: Handler<Event> } = {
  'send for review': (scope, which, reader) =>
    which.trial.state === 'readings in'
      ? askVerdictAgain(scope, which, reader)
      : sendForReview(scope, which, reader),
  start: startTrial,
  adopt,
  'not now': leaveAsIs,
  'plan check runs': planChecks,
  'open again': openAgain,
  pause: pauseTrial,
  hold: holdTrialAs,
  resume: resumeTrial,
  judge: endEarly,
  'raise a problem': raiseProblemAs,
  'settle a problem': settleProblem,
  'something changed': sayChange,
  'back to usual': confirmSetBackAs,
  'add a run': addRunAs,
};

/**
 * Carries out what a person does to a trial.
 * @throws AppError `not-found`, `forbidden`, `not-now`, `changed-meanwhile`, and what the event itself refuses
 */
export function carryOutEvent(
  scope: ShopScope,
  about: { trialId: string; body: TrialEventBody },
  reader: TrialReader,
): Promise<void> {
  return inTransaction(scope, async (inner) => {
    const trial = await findTrialOf(inner, about.trialId);
    const handle = handlers[about.body.event] as Handler<TrialEventBody['event']>;
    await handle(inner, { trial, ...about.body }, reader);
  });
}
