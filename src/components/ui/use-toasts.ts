import { type ReactNode, useCallback, useEffect, useRef, useState } from 'react';
import type { CalloutTone } from './Callout.tsx';

export interface ShownToast {
  readonly id: number;
  readonly tone: CalloutTone;
  readonly words: ReactNode;
}

/** Long enough to look up from the machine and read twice. */
const shownMilliseconds = 8000;

/** Good news and information leave by themselves; a caution or a stop stays until somebody closes it. */
function leavesByItself(tone: CalloutTone): boolean {
  return tone === 'good' || tone === 'info';
}

/** The toasts of an island: what is shown now, and how to show and close one. */
export function useToasts() {
  const [toasts, setToasts] = useState<readonly ShownToast[]>([]);
  const lastId = useRef(0);
  const timers = useRef(new Set<ReturnType<typeof setTimeout>>());

  useEffect(() => {
    const running = timers.current;
    return () => {
      for (const timer of running) clearTimeout(timer);
    };
  }, []);

  const close = useCallback((id: number) => {
    setToasts((shown) => shown.filter((toast) => toast.id !== id));
  }, []);

  const show = useCallback(
    (tone: CalloutTone, words: ReactNode) => {
      lastId.current += 1;
      const id = lastId.current;
      setToasts((shown) => [...shown, { id, tone, words }]);
      if (leavesByItself(tone)) timers.current.add(setTimeout(() => close(id), shownMilliseconds));
    },
    [close],
  );

  return { toasts, show, close };
}
