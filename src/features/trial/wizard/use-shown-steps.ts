import { useEffect, useState } from 'react';
import type { Answers } from '../answers.schema.ts';
import type { WizardStep } from '../questions.ts';
import { answeredSteps } from './step-states.ts';

/**
 * The pages of this trial that were looked at in this browser. What a starter fills in on other pages makes none of them
 * looked at; only a browser that has never shown the trial goes by the answers that are there already.
 */
export function useShownSteps(trialId: string, current: WizardStep, first: Answers): readonly string[] {
  const [shown, setShown] = useState<readonly string[]>([current]);
  const [answered] = useState(() => answeredSteps(first));
  useEffect(() => {
    const key = `trywell.shown.${trialId}`;
    try {
      const before = localStorage.getItem(key)?.split(' ') ?? answered;
      const now = [...new Set([...before, current])];
      localStorage.setItem(key, now.join(' '));
      setShown(now);
    } catch {
      // A browser that keeps nothing goes by the answers, which is enough to go on.
      setShown([...answered, current]);
    }
  }, [trialId, current, answered]);
  return shown;
}
