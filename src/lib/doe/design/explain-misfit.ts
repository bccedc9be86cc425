import type { Brief } from '../brief.ts';
import { isForbidden } from './forbidden.ts';
import { listCorners } from './list-corners.ts';
import { PlanError, type PlanRefusal } from './plan-error.ts';
import type { TimeAndMoney } from './time-and-money.ts';

/** What one plan takes. */
export type Takes = { runs: number } & TimeAndMoney;

/** The first limit that a plan breaks, with what the plan would need; null when it keeps all. */
export function findTightLimit(
  { budget }: Brief,
  { runs, minutes = 0, cost = 0 }: Takes,
): PlanRefusal | null {
  if (runs > budget.maxRuns) return { code: 'too-few-runs', field: 'budget.maxRuns', need: runs };
  if (budget.minutes !== undefined && minutes > budget.minutes)
    return { code: 'too-little-time', field: 'budget.minutes', need: Math.ceil(minutes) };
  if (budget.money !== undefined && cost > budget.money)
    return { code: 'too-little-money', field: 'budget.money', need: Math.ceil(cost) };
  return null;
}

/**
 * Why none of the plans fits: the limit that the plans which keep the limits before it all break, with the least that any of them needs.
 *
 * No plan at all: blocks or whole plots would hide a main effect in each.
 */
export function findMisfit(brief: Brief, plans: readonly Takes[]): PlanError {
  if (plans.length === 0)
    return new PlanError({
      code: 'blocks-too-small',
      field: 'blocks.count',
      need: Math.max(1, (brief.blocks?.count ?? 1) / 2),
    });
  let remaining = [...plans];
  for (const code of ['too-few-runs', 'too-little-time', 'too-little-money'] as const) {
    const refusals = remaining.flatMap((takes) => findTightLimit(brief, takes) ?? []);
    const broken = refusals.filter((refusal) => refusal.code === code);
    if (refusals.length === remaining.length && broken.length === remaining.length)
      return new PlanError(cheapest(broken));
    remaining = remaining.filter((takes) => findTightLimit(brief, takes)?.code !== code);
  }
  return new PlanError({
    code: 'too-few-runs',
    field: 'budget.maxRuns',
    need: Math.min(...plans.map(({ runs }) => runs)),
  });
}

function cheapest(refusals: readonly PlanRefusal[]): PlanRefusal {
  const [first, ...others] = refusals;
  if (first === undefined) throw new RangeError('cheapest: refusals must not be empty');
  return others.reduce(
    (least, refusal) => ((refusal.need ?? 0) < (least.need ?? 0) ? refusal : least),
    first,
  );
}

/** Index of the rule that takes away most corners that no other rule takes. */
export function findWeightiestRule(brief: Brief): number {
  const corners = listCorners(brief.factors.length);
  const taken = brief.forbidden.map((rule, index) => {
    const others = { forbidden: brief.forbidden.filter((_, place) => place !== index) };
    return corners.filter((x) => isForbidden({ forbidden: [rule] }, x) && !isForbidden(others, x)).length;
  });
  return taken.indexOf(Math.max(...taken));
}
