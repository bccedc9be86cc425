import { useState } from 'react';
import { v7 } from 'uuid';
import { useSubmission } from '../../../components/island/use-submission.ts';
import { changeTrialCall, createTrialCall, deleteTrialCall } from '../trial.queries.ts';
import type { PublicTrial } from '../trial.schema.ts';
import type { TrialMoves } from './TrialActions.tsx';

/** What was done last, so that it can be said and taken back. */
export type DoneMove = { kind: 'put away' | 'taken out' | 'deleted'; trial: PublicTrial };

/** Copying, putting away and deleting: the list as it stands after it, and the way back. */
export function useTrialMoves(first: readonly PublicTrial[]) {
  const [trials, setTrials] = useState(first);
  const [done, setDone] = useState<DoneMove | null>(null);
  const [asked, setAsked] = useState<PublicTrial | null>(null);
  const { busy, fault, submit } = useSubmission(() => setAsked(null));

  const without = (trial: PublicTrial) => setTrials((shown) => shown.filter(({ id }) => id !== trial.id));

  const moves: TrialMoves = {
    copy: (trial) =>
      void submit(async () => {
        const id = v7();
        await createTrialCall(id, { copyOf: trial.id });
        window.location.assign(`/trials/${id}/problem`);
      }),
    putAway: (trial, away) =>
      void submit(async () => {
        const changed = await changeTrialCall(trial.id, { revision: trial.revision, putAway: away });
        without(trial);
        setDone({ kind: away ? 'put away' : 'taken out', trial: changed });
      }),
    askToDelete: setAsked,
  };
  const undo = () =>
    submit(async () => {
      if (!done) return;
      const { kind, trial } = done;
      const putAway = kind === 'taken out';
      const changed = await changeTrialCall(trial.id, { revision: trial.revision, putAway });
      setTrials((shown) =>
        first.flatMap(({ id }) => (id === trial.id ? changed : (shown.find((each) => each.id === id) ?? []))),
      );
      setDone(null);
    });
  const remove = () =>
    submit(async () => {
      if (!asked) return;
      await deleteTrialCall(asked);
      without(asked);
      setDone({ kind: 'deleted', trial: asked });
      setAsked(null);
    });
  return { trials, done, asked, busy, fault, moves, undo, remove, stopAsking: () => setAsked(null) };
}
