import type { Language } from '../../i18n/languages.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import type { HazardName, StopRule } from '../trial/answer-choices.ts';
import { readStoredAnswers } from '../trial/answers.repository.ts';
import type { TrialReader } from '../trial/trial-reader.service.ts';
import type { Board } from './board.schema.ts';
import { readBoard } from './read-board.service.ts';
import { safetyOf } from './safety-of.ts';

export interface TrialPaper {
  board: Board;
  /** Whom to call, such as "day: Dana, ext 12". */
  callers: string[];
  /** What may hurt somebody, and when to stop. */
  hazards: HazardName[];
  stopRules: StopRule[];
  ownStopRule: string;
  /** What is written on the parts, such as HOLD; empty where nothing is. */
  label: string;
}

/** What the run sheet and the job tags of a trial say. @throws AppError `not-found`, `not-now` before the start */
export async function readPaper(
  scope: ShopScope,
  trialId: string,
  reader: TrialReader,
  language: Language,
): Promise<TrialPaper> {
  const board = await readBoard(scope, trialId, reader);
  const { answers } = await readStoredAnswers(scope, trialId);
  const callers = (answers.call?.lines ?? []).flatMap(({ when, whom }) => {
    const [time, name] = [when?.trim() ?? '', whom?.trim() ?? ''];
    return name === '' ? [] : [time === '' ? name : `${time}: ${name}`];
  });
  const { hazards, stopRules, ownStopRule } = safetyOf(answers, language);
  const label = answers.parts?.label?.trim() ?? '';
  return { board, callers, hazards, stopRules, ownStopRule, label };
}
