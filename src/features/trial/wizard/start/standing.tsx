import { createContext, useCallback, useContext, useEffect, useState } from 'react';
import { type SubmissionFault, useSubmission } from '../../../../components/island/use-submission.ts';
import type { PublicAnswers } from '../../saved-answers.schema.ts';
import { readAnswersCall } from '../../trial.queries.ts';

/** What is under way on the last page. */
export type StartWork = 'send' | 'start' | 'take back' | 'plan' | 'settle';

export interface Standing {
  /** The trial as the server last told it. */
  now: PublicAnswers;
  /** Whether this reader plans trials, whatever the state is now. */
  isPlanner: boolean;
  /** The reader may not be among those who check. */
  readerId: string;
  work: StartWork | null;
  fault: SubmissionFault | null;
  /** Whether a start was tried with something still to do. */
  isChecked: boolean;
  setChecked(checked: boolean): void;
  /** Asks the server where the trial stands; without an answer what was known stays. */
  refresh(): Promise<void>;
  /** Does one thing at a time; what comes back is what stands from then on. Answers whether it was done. */
  run(work: StartWork, call: (now: PublicAnswers) => Promise<PublicAnswers>): Promise<boolean>;
}

export const StandingContext = createContext<Standing | null>(null);

/** @throws RangeError outside the last page */
export function useStanding(): Standing {
  const standing = useContext(StandingContext);
  if (!standing) throw new RangeError('useStanding: not on the last page');
  return standing;
}

/** Whether the next step is to let the engineer look, not to start. */
export function goesToEngineer({ reviewDue, review }: PublicAnswers): boolean {
  return reviewDue && !(review?.state === 'approved' && review.holds);
}

/** How often the page looks whether the plan was agreed to. */
const lookAgainMilliseconds = 15_000;

/** Follows where the trial stands: what this page does, and what an engineer decides meanwhile. */
export function useStandingOf(
  first: PublicAnswers,
  reader: Pick<Standing, 'isPlanner' | 'readerId'>,
): Standing {
  const [now, setNow] = useState(first);
  const [work, setWork] = useState<StartWork | null>(null);
  const [isChecked, setChecked] = useState(false);
  const { fault, submit } = useSubmission();
  const { trialId, state } = now;

  const refresh = useCallback(() => readAnswersCall(trialId).then(setNow, () => undefined), [trialId]);
  useEffect(() => {
    if (state !== 'plan review') return;
    const look = () => {
      if (document.visibilityState !== 'hidden') void refresh();
    };
    const timer = setInterval(look, lookAgainMilliseconds);
    return () => clearInterval(timer);
  }, [refresh, state]);

  async function run(
    name: StartWork,
    call: (now: PublicAnswers) => Promise<PublicAnswers>,
  ): Promise<boolean> {
    if (work) return false;
    let isDone = false;
    setWork(name);
    await submit(async () => {
      // Saving an answer counts the trial's revision up, so the newest is asked for first.
      setNow(await call(await readAnswersCall(trialId)));
      isDone = true;
    });
    setWork(null);
    return isDone;
  }

  return { now, ...reader, work, fault, isChecked, setChecked, refresh, run };
}
