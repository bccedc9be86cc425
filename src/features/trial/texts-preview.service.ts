import type { Language } from '../../i18n/languages.ts';
import { countSegments } from '../../lib/messages/index.ts';
import { now } from '../../server/clock.ts';
import { inTransaction } from '../../server/db/in-transaction.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { findAddressee } from '../message/addressee.repository.ts';
import { queueMessage } from '../message/message.service.ts';
import { measurePrompt } from '../message/prompt-length.ts';
import { writeMessage } from '../message/write-message.ts';
import { readStoredAnswers } from './answers.repository.ts';
import type { Answers } from './answers.schema.ts';
import { findLatestPlan, type StoredPlan } from './plan.repository.ts';
import { layOutPlan } from './plan.service.ts';
import { crewOf } from './readiness.ts';
import { runPromptOf } from './run-prompt-of.ts';
import type { Practice, TextsPreview } from './texts-preview.schema.ts';
import { findTrialOf, type TrialReader } from './trial-reader.service.ts';

interface Reader {
  language: Language;
  plainLetters: boolean;
}

/** The languages and letters of those who run or measure, once each; before anybody is named, those of whoever looks. */
async function listReaders(scope: ShopScope, answers: Answers, lookerId: string): Promise<Reader[]> {
  const ids = crewOf(answers).map(({ id }) => id);
  const readers = new Map<string, Reader>();
  for (const id of new Set(ids.length > 0 ? ids : [lookerId])) {
    const person = await findAddressee(scope, id);
    if (!person) continue;
    const { language, plainLetters } = person;
    readers.set(`${language} ${plainLetters}`, { language, plainLetters });
  }
  return [...readers.values()];
}

function firstPrompt(answers: Answers, plan: StoredPlan, language: Language) {
  const runs = layOutPlan(plan);
  const [first] = runs;
  if (!first) throw new RangeError('firstPrompt: plan has no runs');
  const run = { order: first.order, planned: first.actual };
  return runPromptOf(answers, { run, runs: runs.length, settingIds: plan.settingIds }, language);
}

/** Texts to one person over the whole trial: each run, each further result, what comes later, and the word at the end. */
function textsOf(answers: Answers, runs: number): { prompts: number; others: number } {
  const asksLater = answers.measuring?.when !== undefined && answers.measuring.when !== 'atOnce';
  const further = (answers.watch?.results.length ?? 0) + (asksLater ? 1 : 0);
  return { prompts: runs, others: runs * further + 1 };
}

/** Run 1 in each language of the crew, how long it is, and what the trial will send in all. @throws AppError `not-found` */
export async function previewTexts(
  scope: ShopScope,
  trialId: string,
  reader: TrialReader,
): Promise<TextsPreview> {
  await findTrialOf(scope, trialId);
  const { answers } = await readStoredAnswers(scope, trialId);
  const plan = await findLatestPlan(scope, trialId);
  if (!plan) return { texts: [], whole: null };
  const texts: TextsPreview['texts'] = [];
  for (const { language, plainLetters } of await listReaders(scope, answers, reader.personId)) {
    const params = firstPrompt(answers, plan, language);
    if (!params) continue;
    const { body } = writeMessage({ template: 'runPrompt', params, language, plainLetters });
    const { units, encoding, segments } = countSegments(body);
    const length = measurePrompt(params, { language, plainLetters });
    const tooLong = length.fits ? null : { name: length.name, letters: length.letters };
    texts.push({ language, body, units, sevenBit: encoding === 'seven-bit', segments, tooLong });
  }
  if (texts.length === 0) return { texts, whole: null };
  const { prompts, others } = textsOf(answers, plan.proposal.runs);
  const longest = Math.max(...texts.map(({ segments }) => segments));
  return { texts, whole: { texts: prompts + others, segments: prompts * longest + others } };
}

const minute = 60_000;

/** Sends run 1 to the reader's own phone, marked as practice; at most once a minute. @throws AppError `not-found` */
export async function sendPractice(
  scope: ShopScope,
  trialId: string,
  reader: TrialReader,
): Promise<Practice> {
  await findTrialOf(scope, trialId);
  const { answers } = await readStoredAnswers(scope, trialId);
  const plan = await findLatestPlan(scope, trialId);
  const person = await findAddressee(scope, reader.personId);
  if (!person?.phone) return { outcome: 'no phone' };
  if (person.consent !== 'agreed') return { outcome: 'no consent' };
  const prompt = plan && firstPrompt(answers, plan, person.language);
  if (!prompt) return { outcome: 'no plan' };
  return inTransaction(scope, async (inner) => {
    const queued = await queueMessage(inner, {
      template: 'practiceRun',
      params: { prompt },
      personId: reader.personId,
      trialId,
      dedupe: `practice-run:${trialId}:${reader.personId}:${Math.floor(now() / minute)}`,
    });
    return { outcome: queued.queued ? 'queued' : 'already' };
  });
}
