import { useQuery, useQueryClient } from '@tanstack/react-query';
import { useEffect, useRef } from 'react';
import { useSubmission } from '../../../../components/island/use-submission.ts';
import { choosePlanCall, readAnswersCall } from '../../trial.queries.ts';
import { useWizard } from '../wizard-context.ts';

/** Longer than it takes until what was typed is saved. */
const settledAfter = 1_500;

/** The plan that was taken, whether it still fits the answers, and how to take another. */
export function useChosenPlan() {
  const { trialId, answers, flush } = useWizard();
  const client = useQueryClient();
  const key = ['trial plan', trialId];
  const { data } = useQuery({ queryKey: key, queryFn: () => readAnswersCall(trialId) });
  const { busy, fault, submit } = useSubmission();
  const first = useRef(answers);

  // Each changed answer may end what the plan was made for; the server says so once it is saved.
  useEffect(() => {
    if (answers === first.current) return;
    const timer = setTimeout(
      () => void client.invalidateQueries({ queryKey: ['trial plan', trialId] }),
      settledAfter,
    );
    return () => clearTimeout(timer);
  }, [answers, client, trialId]);

  const take = (proposalId: string) =>
    submit(async () => {
      await flush();
      const { revision } = await readAnswersCall(trialId);
      client.setQueryData(key, await choosePlanCall(trialId, { revision, proposalId }));
    });
  return { plan: data?.plan ?? null, busy, fault, take };
}
