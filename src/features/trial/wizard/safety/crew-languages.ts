import type { Language } from '../../../../i18n/languages.ts';
import type { Answers } from '../../answers.schema.ts';
import { crewOf } from '../../readiness.ts';
import type { CrewMember } from '../wizard-context.ts';

/**
 * The languages in which a safety line must be there: of those who run or measure on some shift; until somebody is
 * named, of everybody who could run.
 */
export function crewLanguages(answers: Answers, people: readonly CrewMember[]): Language[] {
  const named = new Set(crewOf(answers).map(({ id }) => id));
  const onCrew = people.filter(({ id }) => named.has(id));
  const couldRun = people.filter(({ roles }) => roles.includes('operator'));
  const readers = onCrew.length > 0 ? onCrew : couldRun;
  return [...new Set(readers.map(({ language }) => language))].sort();
}
