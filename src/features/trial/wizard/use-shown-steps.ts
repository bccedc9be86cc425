import { useEffect, useState } from 'react';
import type { WizardStep } from '../questions.ts';

/** The pages of this trial that this browser has shown, the present one added; empty on the server and at first. */
export function useShownSteps(trialId: string, current: WizardStep): readonly string[] {
  const [shown, setShown] = useState<readonly string[]>([]);
  useEffect(() => {
    const key = `trywell.shown.${trialId}`;
    try {
      const before = localStorage.getItem(key)?.split(' ') ?? [];
      const now = [...new Set([...before, current])];
      localStorage.setItem(key, now.join(' '));
      setShown(now);
    } catch {
      // A browser that keeps nothing offers the pages with answers, which is enough to go on.
    }
  }, [trialId, current]);
  return shown;
}
