import { useEffect, useState } from 'react';
import { choosePlanCall } from '../../trial.queries.ts';
import { type SoFar, useWizard } from '../wizard-context.ts';
import { type LookedMix, mixRule, ruleText } from './look-mixes.ts';
import { useStanding } from './standing.tsx';

export type Remake = 'none' | 'working' | 'done' | 'failed';

/** A rule that the plan is made again for. */
interface Wanted {
  rule: string;
  isRuledOut: boolean;
}

function knows({ brief }: SoFar, { rule, isRuledOut }: Wanted): boolean {
  return brief !== null && brief.forbidden.map(ruleText).includes(rule) === isRuledOut;
}

/**
 * Makes the plan again once a mix was ruled out or taken back in: waits until the plans beside the page know of it, then
 * takes the same kind of plan, or the recommended one where that kind is gone.
 */
export function useRemake(): { remake: Remake; ask: (decided: LookedMix) => void } {
  const { answers, soFar, trialId, flush } = useWizard();
  const { now, run } = useStanding();
  const [wanted, setWanted] = useState<Wanted | null>(null);
  const [remake, setRemake] = useState<Remake>('none');

  useEffect(() => {
    if (!wanted || !knows(soFar, wanted)) return;
    setWanted(null);
    const { proposals } = soFar;
    const chosen =
      proposals.find(({ id }) => id === now.plan?.proposalId) ??
      proposals.find(({ recommended }) => recommended) ??
      proposals[0];
    if (!chosen) {
      setRemake('failed');
      return;
    }
    void run('plan', ({ revision }) => choosePlanCall(trialId, { revision, proposalId: chosen.id })).then(
      (isDone) => setRemake(isDone ? 'done' : 'none'),
    );
  }, [wanted, soFar, now, run, trialId]);

  function ask({ ends, decision }: LookedMix): void {
    const settingIds = answers.settings?.settings.map(({ id }) => id) ?? [];
    const rule = mixRule(ends, settingIds);
    if (rule === null) return;
    setRemake('working');
    // The server makes the plan from what is saved.
    void flush().then(() => setWanted({ rule, isRuledOut: decision === 'ruledOut' }));
  }

  return { remake, ask };
}
