import { readFinished } from '../trial/answer-problem.ts';
import type { Answers } from '../trial/answers.schema.ts';

/** What may hurt, when to stop, whom to call and what to write on the parts, for those at the machine. */
export function safetyOf(answers: Answers, language: string) {
  const hazards = readFinished(answers, 'hazards');
  const stop = readFinished(answers, 'stop');
  const call = readFinished(answers, 'call');
  const parts = readFinished(answers, 'parts');
  const own = 'value' in stop ? Object.entries(stop.value.own) : [];
  return {
    hazards: 'value' in hazards ? hazards.value.ticked.map(({ hazard }) => hazard) : [],
    stopRules: 'value' in stop ? stop.value.picked : [],
    ownStopRule: (own.find(([spoken]) => spoken === language) ?? own[0])?.[1] ?? '',
    call: 'value' in call ? call.value.lines.map(({ when, whom }) => ({ when, whom })) : [],
    label: 'value' in parts ? parts.value.label : '',
  };
}
