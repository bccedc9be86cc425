import type { ShopScope } from '../../server/db/scope.ts';
import { readStoredAnswers } from '../trial/answers.repository.ts';
import type { TrialReader } from '../trial/trial-reader.service.ts';
import type { Board } from './board.schema.ts';
import { readBoard } from './read-board.service.ts';

export interface TrialPaper {
  board: Board;
  /** Whom to call, such as "day: Dana, ext 12". */
  callers: string[];
  /** What is written on the parts, such as HOLD; empty where nothing is. */
  label: string;
}

/** What the run sheet and the job tags of a trial say. @throws AppError `not-found`, `not-now` before the start */
export async function readPaper(scope: ShopScope, trialId: string, reader: TrialReader): Promise<TrialPaper> {
  const board = await readBoard(scope, trialId, reader);
  const { answers } = await readStoredAnswers(scope, trialId);
  const callers = (answers.call?.lines ?? []).flatMap(({ when, whom }) => {
    const [time, name] = [when?.trim() ?? '', whom?.trim() ?? ''];
    return name === '' ? [] : [time === '' ? name : `${time}: ${name}`];
  });
  return { board, callers, label: answers.parts?.label?.trim() ?? '' };
}
