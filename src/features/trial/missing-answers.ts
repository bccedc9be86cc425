import type { Language } from '../../i18n/languages.ts';
import { type AnswerProblem, readFinished } from './answer-problem.ts';
import type { Answers } from './answers.schema.ts';
import { readBriefAnswers } from './brief/brief-answers.ts';
import { questionsInOrder } from './finished.schema.ts';

/**
 * All that keeps the answers from being complete, in the order of the pages: what is missing or does not fit, and
 * what does not agree.
 */
export function missingAnswers(answers: Answers): AnswerProblem[] {
  const single = questionsInOrder.flatMap((question) => {
    const read = readFinished(answers, question);
    return 'problems' in read ? read.problems : [];
  });
  const brief = readBriefAnswers(answers);
  const between = 'problems' in brief ? brief.problems : [];
  const known = new Set(single.map(keyOf));
  return [...single, ...between.filter((problem) => !known.has(keyOf(problem)))].sort(
    (one, other) => questionsInOrder.indexOf(one.question) - questionsInOrder.indexOf(other.question),
  );
}

function keyOf({ question, pointer, code }: AnswerProblem): string {
  return `${question} ${pointer} ${code}`;
}

/** Whether the answers name something that can hurt somebody. */
export function namesHazard(answers: Answers): boolean {
  return (answers.hazards?.ticked.length ?? 0) > 0;
}

/**
 * Stop rules in the shop's own words that somebody on the crew could not read. The built-in ones are there in every
 * language.
 */
export function missingVersions(answers: Answers, crewLanguages: readonly Language[]): AnswerProblem[] {
  const own = answers.stop?.own ?? {};
  const isSaid = Object.values(own).some((text) => text?.trim());
  if (!isSaid) return [];
  return [...new Set(crewLanguages)]
    .filter((language) => !own[language]?.trim())
    .map((language) => ({
      question: 'stop',
      pointer: `#/own/${language}`,
      code: 'version-missing',
      values: { language },
    }));
}
