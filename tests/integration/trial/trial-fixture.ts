import type { AnswerOf, Answers, QuestionName } from '../../../src/features/trial/answers.schema.ts';
import { readAnswers, saveAnswer } from '../../../src/features/trial/answers.service.ts';
import { choosePlan } from '../../../src/features/trial/plan.service.ts';
import { findReview } from '../../../src/features/trial/review.repository.ts';
import { decideReview, type ReviewDecision } from '../../../src/features/trial/review.service.ts';
import type { PublicAnswers } from '../../../src/features/trial/saved-answers.schema.ts';
import { toBrief } from '../../../src/features/trial/to-brief.ts';
import { createTrial } from '../../../src/features/trial/trial.service.ts';
import { carryOutEvent } from '../../../src/features/trial/trial-event.service.ts';
import type { TrialReader } from '../../../src/features/trial/trial-reader.service.ts';
import { proposePlans } from '../../../src/lib/doe/index.ts';
import type { Role } from '../../../src/server/auth/permissions.ts';
import type { ShopScope } from '../../../src/server/db/scope.ts';
import { newId } from '../../../src/server/ids.ts';
import { finishedAnswers } from '../../builders/answers.ts';
import { buildPerson, buildShop } from '../../builders/shop.ts';

export interface TrialShop {
  scope: ShopScope;
  dana: TrialReader;
  /** Runs everything. */
  anaId: string;
  /** Somebody who acts in this shop, with their own scope. */
  add(roles: Role[], overrides?: Record<string, unknown>): Promise<TrialReader>;
  as(reader: TrialReader): ShopScope;
}

/** A shop with a supervisor and an operator; it asks an engineer where there is a hazard, unless told otherwise. */
export async function buildTrialShop(overrides: Record<string, unknown> = {}): Promise<TrialShop> {
  const shop = await buildShop(overrides);
  const as = (reader: TrialReader): ShopScope => ({
    ...shop,
    actor: { kind: 'person', id: reader.personId },
  });
  const add = async (roles: Role[], more: Record<string, unknown> = {}): Promise<TrialReader> => ({
    personId: await buildPerson(shop, roles, { password_hash: 'x', ...more }),
    roles,
  });
  const dana = await add(['supervisor'], { name: 'Dana', phone: '+12025550190', consent: 'agreed' });
  const { personId: anaId } = await add(['operator'], { name: 'Ana', language: 'es', password_hash: null });
  return { scope: as(dana), dana, anaId, add, as };
}

export async function save<Name extends QuestionName>(
  shop: TrialShop,
  trialId: string,
  question: Name,
  content: AnswerOf<Name>,
  base?: number,
) {
  const { questions } = await readAnswers(shop.scope, trialId, shop.dana);
  const known = base ?? questions[question]?.version ?? 0;
  const wish = { trialId, question, content, base: known, save: newId() };
  return saveAnswer(shop.scope, wish, shop.dana);
}

/** Answers from which a trial can start in this shop, save the word on the hardest mixes. */
export function answersFor(shop: TrialShop, more: Answers = {}): Answers {
  const crew = { shifts: [{ id: 'day', name: 'Day', runs: shop.anaId }] };
  return finishedAnswers({ crew, ...more });
}

/** A draft with these answers. */
export async function buildDraft(shop: TrialShop, answers: Answers = answersFor(shop)): Promise<string> {
  const id = newId();
  await createTrial(shop.scope, { id }, shop.dana);
  for (const question of Object.keys(answers) as QuestionName[]) {
    await save(shop, id, question, answers[question] as AnswerOf<typeof question>);
  }
  return id;
}

export function read(shop: TrialShop, trialId: string, reader = shop.dana): Promise<PublicAnswers> {
  return readAnswers(shop.scope, trialId, reader);
}

export async function typedAnswers(shop: TrialShop, trialId: string): Promise<Answers> {
  const { questions } = await read(shop, trialId);
  return Object.fromEntries(
    Object.entries(questions).map(([question, saved]) => [question, saved?.content]),
  ) as Answers;
}

/** The id of the plan that the core would take for what is stored. */
export async function recommendedPlan(shop: TrialShop, trialId: string): Promise<string> {
  const brief = toBrief(await typedAnswers(shop, trialId));
  if ('problems' in brief) throw new Error(JSON.stringify(brief.problems));
  return proposePlans(brief.brief)[0]?.id ?? '';
}

export async function choose(shop: TrialShop, trialId: string, proposalId?: string): Promise<PublicAnswers> {
  const { revision } = await read(shop, trialId);
  const id = proposalId ?? (await recommendedPlan(shop, trialId));
  await choosePlan(shop.scope, { trialId, revision, proposalId: id }, shop.dana);
  return read(shop, trialId);
}

/** A draft with a plan, each hardest mix of it run before. */
export async function buildPlanned(shop: TrialShop, more: Answers = {}): Promise<string> {
  const id = await buildDraft(shop, answersFor(shop, more));
  const { plan } = await choose(shop, id);
  const mixes = plan?.hardest.map(({ ends }) => ({ ends, decision: 'runBefore' as const })) ?? [];
  await save(shop, id, 'look', { mixes });
  return id;
}

export async function act(
  shop: TrialShop,
  trialId: string,
  event: 'send for review' | 'start',
  reader = shop.dana,
): Promise<PublicAnswers> {
  const { revision } = await read(shop, trialId);
  await carryOutEvent(shop.as(reader), { trialId, body: { event, revision } }, reader);
  return read(shop, trialId);
}

/** Decides the review that is open now. */
export async function decide(
  shop: TrialShop,
  trialId: string,
  decision: ReviewDecision,
  reader: TrialReader,
) {
  const { review } = await read(shop, trialId);
  const id = review?.id ?? '';
  const round = (await findReview(shop.scope, id))?.round ?? 0;
  return decideReview(shop.as(reader), { id, round, decision }, reader);
}

export const noHazard: Answers = { hazards: { none: true, ticked: [] } };
