import { startTransition, useEffect, useRef, useState } from 'react';
import type { Answers } from '../answers.schema.ts';
import type { SoFar } from './wizard-context.ts';

/** What the answers mean, worked out beside the page. While it works only the newest answers wait; null until the first result. */
export function useSoFar(answers: Answers): SoFar | null {
  const [soFar, setSoFar] = useState<SoFar | null>(null);
  const beside = useRef<{ ask: (answers: Answers) => void } | null>(null);

  useEffect(() => {
    const worker = new Worker(new URL('./so-far.worker.ts', import.meta.url), { type: 'module' });
    let isBusy = false;
    let waiting: Answers | null = null;
    const ask = (next: Answers) => {
      if (isBusy) {
        waiting = next;
        return;
      }
      isBusy = true;
      worker.postMessage(next);
    };
    worker.addEventListener('message', ({ data }: MessageEvent<SoFar>) => {
      isBusy = false;
      if (waiting) {
        const next = waiting;
        waiting = null;
        ask(next);
      } else startTransition(() => setSoFar(data));
    });
    beside.current = { ask };
    return () => worker.terminate();
  }, []);

  useEffect(() => beside.current?.ask(answers), [answers]);
  return soFar;
}
