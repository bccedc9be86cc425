import { createContext, useContext } from 'react';
import type { SubmissionFault } from '../../../components/island/use-submission.ts';
import type { CalloutTone } from '../../../components/ui/Callout.tsx';
import type { Formats } from '../../../i18n/format.ts';
import type { Board } from '../board.schema.ts';
import type { RunEventInput } from '../run-event.schema.ts';
import type { RunTrialEventInput } from '../trial-run-event.schema.ts';

/** What every part of a board leans on. */
export interface BoardTools {
  board: Board;
  formats: Formats;
  /** One thing at a time is sent; the board is asked for anew after it. @returns whether it was done */
  doTrial(event: RunTrialEventInput): Promise<boolean>;
  doRun(runId: string, event: RunEventInput): Promise<boolean>;
  /** After something was sent in another way. */
  refreshBoard(): Promise<void>;
  busy: boolean;
  fault: SubmissionFault | null;
  clearFault(): void;
  say(tone: CalloutTone, words: string): void;
}

export const BoardContext = createContext<BoardTools | null>(null);

export function useBoardTools(): BoardTools {
  const tools = useContext(BoardContext);
  if (!tools) throw new RangeError('useBoardTools: outside of a board');
  return tools;
}
