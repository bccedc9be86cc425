import type { AnswerOf } from '../../answers.schema.ts';
import type { CrewMember } from '../wizard-context.ts';

/** Who may be asked to run or measure, those who do so every day first. */
export function listRunners(people: readonly CrewMember[]): CrewMember[] {
  const isOperator = ({ roles }: CrewMember) => roles.includes('operator');
  return [...people.filter(isOperator), ...people.filter((person) => !isOperator(person))];
}

/** Who may be called: people, those who answer for safety and the shift first. */
export function listCallees(people: readonly CrewMember[]): CrewMember[] {
  const rank = ({ safetyPerson, roles }: CrewMember) =>
    safetyPerson ? 0 : roles.includes('supervisor') ? 1 : roles.includes('engineer') ? 2 : 3;
  return people.filter(({ kind }) => kind === 'person').toSorted((one, other) => rank(one) - rank(other));
}

/** Everybody who runs or measures on some shift, once each. */
export function crewMembers(shifts: AnswerOf<'crew'>['shifts'], people: readonly CrewMember[]): CrewMember[] {
  const ids = new Set(shifts.flatMap(({ runs = '', measures = '' }) => [runs, measures]));
  return people.filter(({ id }) => ids.has(id));
}
