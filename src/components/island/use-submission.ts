import { useState } from 'react';
import { NoConnection, type ServerProblem, ServerRefusal } from './call-server.ts';

/** Why a form was not saved: a refusal in the server's words, no connection, or a session that has ended. */
export type SubmissionFault =
  | { kind: 'refused'; problem: ServerProblem }
  | { kind: 'offline' }
  | { kind: 'signed out' };

/** A thrown thing as what the form shows; whatever is neither refusal nor silence is a fault of our own and is thrown on. */
export function readSubmissionFault(thrown: unknown): SubmissionFault {
  if (thrown instanceof NoConnection) return { kind: 'offline' };
  if (!(thrown instanceof ServerRefusal)) throw thrown;
  if (thrown.problem.code === 'not-signed-in') return { kind: 'signed out' };
  return { kind: 'refused', problem: thrown.problem };
}

/**
 * One thing at a time that is sent to the server: whether it is under way, and why the last one failed.
 * @param onRefused hears of a refusal first, to put its sentences at the fields they belong to
 */
export function useSubmission(onRefused?: (problem: ServerProblem) => void) {
  const [busy, setBusy] = useState(false);
  const [fault, setFault] = useState<SubmissionFault | null>(null);

  async function submit(work: () => Promise<void>): Promise<void> {
    setBusy(true);
    setFault(null);
    try {
      await work();
    } catch (thrown) {
      const why = readSubmissionFault(thrown);
      setFault(why);
      if (why.kind === 'refused') onRefused?.(why.problem);
    } finally {
      setBusy(false);
    }
  }

  return { busy, fault, submit, clearFault: () => setFault(null) };
}
