import type { FieldProblem } from '../../i18n/field-codes.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { AppError } from '../../server/errors.ts';
import { findShop } from '../shop/shop.repository.ts';
import type { AnswerProblem } from './answer-problem.ts';
import type { Answers } from './answers.schema.ts';
import { missingAnswers, missingVersions, namesHazard } from './missing-answers.ts';
import type { StoredPlan } from './plan.repository.ts';
import { hardestMixes, planFits } from './plan.service.ts';
import { crewOf, leavesToEngineer, toFields, undecidedMixes } from './readiness.ts';
import type { SecondPerson } from './saved-answers.schema.ts';
import { listCrewMembers, listReviewers } from './trial-people.repository.ts';

async function problemsOfCrew(scope: ShopScope, answers: Answers): Promise<AnswerProblem[]> {
  const crew = crewOf(answers);
  const members = await listCrewMembers(
    scope,
    crew.map(({ id }) => id),
  );
  const gone = crew.filter(({ id }) => !members.some((member) => member.id === id));
  return [
    ...gone.map(({ pointer }): AnswerProblem => ({ question: 'crew', pointer, code: 'person-gone' })),
    ...missingVersions(
      answers,
      members.map(({ language }) => language),
    ),
  ];
}

/**
 * Makes sure that a trial can be run as it stands: every answer, a plan that fits them, each of its hardest mixes looked
 * at, the crew still there and able to read the stop rules.
 * @param check.ready whether the list before the start must be ticked too
 * @throws AppError `invalid` naming all that is missing
 */
export async function requireComplete(
  scope: ShopScope,
  check: { answers: Answers; plan: StoredPlan | null; ready: boolean },
): Promise<StoredPlan> {
  const { answers, plan } = check;
  const missing = missingAnswers(answers).filter(({ question }) => check.ready || question !== 'ready');
  const fields: FieldProblem[] = toFields([...missing, ...(await problemsOfCrew(scope, answers))]);
  if (plan === null || !planFits(plan, answers)) {
    throw new AppError('invalid', { fields: [...fields, { pointer: '#/plan', code: 'choose-plan' }] });
  }
  const isLookedAt = undecidedMixes(answers, hardestMixes(plan)).length === 0;
  if (!isLookedAt) fields.push({ pointer: '#/look', code: 'decide-mix' });
  if (fields.length > 0) throw new AppError('invalid', { fields });
  return plan;
}

/** Whether somebody else must agree first, by the shop's rule and by what was left to the engineer. */
export async function findSecondPerson(
  scope: ShopScope,
  trial: { answers: Answers; plan: StoredPlan | null },
  personId: string,
): Promise<SecondPerson> {
  const { answers, plan } = trial;
  const { planReview } = await findShop(scope);
  const isAsked = plan !== null && leavesToEngineer(answers, hardestMixes(plan));
  const isDue = isAsked || planReview === 'always' || (planReview === 'hazard' && namesHazard(answers));
  if (!isDue) return 'not needed';
  const reviewers = await listReviewers(scope);
  if (reviewers.some((id) => id !== personId)) return 'needed';
  return reviewers.includes(personId) ? 'alone' : 'missing';
}
