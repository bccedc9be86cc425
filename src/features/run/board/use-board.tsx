import { useCallback, useEffect, useRef, useState } from 'react';
import { pollBoard } from '../board.queries.ts';
import type { Board } from '../board.schema.ts';

const pollMilliseconds = 3_000;
/** So long without an answer, and the board says that it may be old. */
const liveMilliseconds = 15_000;

export interface LiveBoard {
  board: Board;
  /** When it was last known to be right; null while it is. */
  lostSince: number | null;
  refresh(): Promise<void>;
}

/** The board, asked for again and again while somebody looks at it. */
export function useBoard(first: Board): LiveBoard {
  const [board, setBoard] = useState(first);
  const [lostSince, setLostSince] = useState<number | null>(null);
  const known = useRef(first);
  const rightAt = useRef<number | null>(null);

  const refresh = useCallback(async () => {
    rightAt.current ??= Date.now();
    try {
      const next = await pollBoard(known.current);
      // An answer that was under way while a newer one came must not take it back.
      if (next.revision >= known.current.revision) known.current = next;
      setBoard(known.current);
      rightAt.current = Date.now();
      setLostSince(null);
    } catch {
      if (Date.now() - rightAt.current > liveMilliseconds) setLostSince(rightAt.current);
    }
  }, []);

  useEffect(() => {
    let timer: ReturnType<typeof setTimeout>;
    let isOver = false;
    const tick = async () => {
      if (!document.hidden) await refresh();
      if (!isOver) timer = setTimeout(tick, pollMilliseconds);
    };
    const look = () => {
      if (!document.hidden) void refresh();
    };
    timer = setTimeout(tick, pollMilliseconds);
    document.addEventListener('visibilitychange', look);
    window.addEventListener('online', look);
    return () => {
      isOver = true;
      clearTimeout(timer);
      document.removeEventListener('visibilitychange', look);
      window.removeEventListener('online', look);
    };
  }, [refresh]);

  return { board, lostSince, refresh };
}
