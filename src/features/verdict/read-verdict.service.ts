import { usualValues } from '../../lib/doe/index.ts';
import { rolesMay } from '../../server/auth/permissions.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { findShop } from '../shop/shop.repository.ts';
import { readFinished } from '../trial/answer-problem.ts';
import { readStoredAnswers } from '../trial/answers.repository.ts';
import type { Answers } from '../trial/answers.schema.ts';
import { findLatestPlan } from '../trial/plan.repository.ts';
import { findTrialOf, type TrialReader } from '../trial/trial-reader.service.ts';
import { listDecisions } from './decision.repository.ts';
import { readTrialSpan } from './trial-span.repository.ts';
import { findVerdict } from './verdict.repository.ts';
import type { VerdictView } from './verdict-view.ts';

function safetyOf(answers: Answers) {
  const hazards = readFinished(answers, 'hazards');
  const stop = readFinished(answers, 'stop');
  const call = readFinished(answers, 'call');
  const parts = readFinished(answers, 'parts');
  return {
    hazards: 'value' in hazards ? hazards.value.ticked : [],
    stop: 'value' in stop ? stop.value : { picked: [], own: {} },
    call: 'value' in call ? call.value.lines.map(({ when, whom }) => ({ when, whom })) : [],
    partsFate: 'value' in parts ? parts.value.fate : null,
  };
}

function worthOf(answers: Answers): { partsPerWeek: number | null; costOfBadPart: number | null } {
  const value = readFinished(answers, 'value');
  return 'value' in value ? value.value : { partsPerWeek: null, costOfBadPart: null };
}

/**
 * A verdict of a trial as its page shows it: from what was stored when it was made.
 * @param which.n which one; the latest unless told
 * @returns null while there is none
 * @throws AppError `not-found`, for another shop's trial too
 */
export async function readVerdict(
  scope: ShopScope,
  which: { trialId: string; n?: number; language: string },
  reader: TrialReader | null,
): Promise<VerdictView | null> {
  const trial = await findTrialOf(scope, which.trialId);
  const latest = await findVerdict(scope, trial.id);
  const verdict = which.n === undefined ? latest : await findVerdict(scope, trial.id, which.n);
  const plan = await findLatestPlan(scope, trial.id, 'main');
  if (!verdict || !latest || !plan) return null;
  const { answers } = await readStoredAnswers(scope, trial.id);
  const { stop, ...safety } = safetyOf(answers);
  const { firstAt, lastAt, skipped } = await readTrialSpan(scope, trial.id);
  const { brief } = plan;
  const shop = await findShop(scope);
  const own = Object.entries(stop.own);
  return {
    trialId: trial.id,
    number: trial.number,
    title: trial.title,
    machine: trial.machine,
    madeAt: verdict.madeAt,
    n: verdict.n,
    state: trial.state,
    isLatest: verdict.n === latest.n,
    brief,
    verdict: verdict.facts.verdict,
    bet: verdict.facts.bet,
    confirmation: verdict.facts.confirmation,
    panelNames: brief.factors.map(({ panelName, name }) => panelName ?? name),
    units: brief.factors.map((factor) => (factor.kind === 'number' ? factor.unit : '')),
    runs: verdict.facts.runs,
    usual: usualValues(brief),
    ...safety,
    // The reader's own language first, else the one it was written in.
    stop: {
      picked: stop.picked,
      own: (own.find(([language]) => language === which.language) ?? own[0])?.[1] ?? '',
    },
    value: { ...worthOf(answers), currency: shop.currency },
    hours: firstAt === null || lastAt === null ? null : (lastAt - firstAt) / 3_600_000,
    decisions: await listDecisions(scope, trial.id),
    mayDecide: reader !== null && rolesMay(reader.roles, 'decide') && trial.state === 'deciding',
    reviewDue: trial.state === 'verdict review',
    endedEarly: skipped > 0,
    plannedRuns: plan.proposal.runs,
  };
}
