import { type Brief, briefSchema, type FactorSpec, type ResponseSpec } from '../brief.ts';
import { canShowMainEffects, listAllowedCorners } from './allowed-corners.ts';
import { PlanError, type PlanErrorCode } from './plan-error.ts';
import { lettersUpTo } from './words.ts';

const mostHard = 2;

/**
 * Refuses a brief that makes no sense, by the first fault in reading order.
 *
 * @throws PlanError with the path of the field and, where one value would do, the value it needs.
 */
export function checkBrief(brief: Brief): void {
  checkShape(brief);
  checkResponse(brief.response, 'response', true);
  for (const [index, response] of brief.watch.entries()) checkResponse(response, `watch.${index}`, false);
  for (const [index, factor] of brief.factors.entries()) checkFactor(factor, `factors.${index}`);
  checkNames(brief);
  const hard = brief.factors.flatMap((factor, index) => (factor.hardToChange ? [index] : []));
  if (hard.length > mostHard)
    refuse('too-many-hard-factors', `factors.${hard[mostHard]}.hardToChange`, mostHard);
  checkBudget(brief);
  checkNoise(brief);
  checkBlocks(brief);
  checkRules(brief);
}

function checkShape(brief: Brief): void {
  const issue = briefSchema.safeParse(brief).error?.issues[0];
  if (issue === undefined) return;
  const field = issue.path.join('.');
  if (field === 'factors' && issue.code === 'too_small') refuse('no-factors', field, 1);
  if (field === 'factors' && issue.code === 'too_big') refuse('too-many-factors', field, 7);
  const value = issue.path.reduce<unknown>(
    (inside, key) => (inside as Record<PropertyKey, unknown> | undefined)?.[key],
    brief,
  );
  if (typeof value === 'number') refuse('not-a-number', field);
  refuse(value === undefined ? 'missing' : 'malformed', field);
}

function checkResponse(response: ResponseSpec, field: string, isMain: boolean): void {
  const { kind, worthHaving, usualRate } = response;
  checkNamed(response.name, `${field}.name`);
  if (isMain && worthHaving === undefined) refuse('missing', `${field}.worthHaving`);
  for (const key of ['worthHaving', 'steadierWorthHaving'] as const)
    checkPositive(response[key], `${field}.${key}`);
  for (const key of ['lotSize', 'partsPerRun'] as const) checkWhole(response[key], `${field}.${key}`);
  if (response.resolution !== undefined && response.resolution < 0)
    refuse('not-positive', `${field}.resolution`, 0);
  if (kind === 'rejects') {
    if (response.lotSize === undefined) refuse('missing', `${field}.lotSize`);
    checkShare(usualRate, `${field}.usualRate`);
    checkShare(worthHaving, `${field}.worthHaving`);
  }
  if (kind === 'flaws' && usualRate !== undefined && usualRate < 0)
    refuse('out-of-range', `${field}.usualRate`, 0);
  if (response.goal === 'target' && response.target === undefined) refuse('missing', `${field}.target`);
  const { lower, upper, limitProbability } = response;
  if (lower !== undefined && upper !== undefined && lower >= upper)
    refuse('limits-crossed', `${field}.upper`);
  if (limitProbability !== undefined && !(limitProbability > 0 && limitProbability < 1))
    refuse('out-of-range', `${field}.limitProbability`);
}

function checkFactor(factor: FactorSpec, field: string): void {
  checkNamed(factor.name, `${field}.name`);
  for (const key of ['settleMinutes', 'discardParts'] as const)
    if ((factor[key] ?? 0) < 0) refuse('out-of-range', `${field}.${key}`, 0);
  if (factor.kind === 'choice') {
    checkNamed(factor.low, `${field}.low`);
    checkNamed(factor.high, `${field}.high`);
    if (fold(factor.low) === fold(factor.high)) refuse('same-choice-names', `${field}.high`);
    return;
  }
  const { low, high, usual, step, min, max } = factor;
  if (!(low < high)) refuse('low-not-below-high', `${field}.low`);
  if (min !== undefined && low < min) refuse('beyond-machine-limits', `${field}.low`, min);
  if (max !== undefined && high > max) refuse('beyond-machine-limits', `${field}.high`, max);
  if (usual < low) refuse('usual-outside', `${field}.usual`, low);
  if (usual > high) refuse('usual-outside', `${field}.usual`, high);
  checkPositive(step, `${field}.step`);
  // Low, middle and high must be three places of the dial.
  if (step !== undefined && 2 * step > (high - low) * (1 + 1e-9))
    refuse('step-too-coarse', `${field}.step`, (high - low) / 2);
}

function checkNames(brief: Brief): void {
  const results = [brief.response, ...brief.watch].map(({ name }, index) => ({
    name,
    field: index === 0 ? 'response.name' : `watch.${index - 1}.name`,
  }));
  const settings = brief.factors.map(({ name }, index) => ({ name, field: `factors.${index}.name` }));
  for (const group of [results, settings]) {
    const seen = new Set<string>();
    for (const { name, field } of group) {
      if (seen.has(fold(name))) refuse('duplicate-name', field);
      seen.add(fold(name));
    }
  }
}

function checkBudget({ budget }: Brief): void {
  checkWhole(budget.maxRuns, 'budget.maxRuns');
  for (const key of ['minutes', 'money'] as const) checkPositive(budget[key], `budget.${key}`);
  for (const key of ['minutesPerRun', 'costPerRun'] as const)
    if ((budget[key] ?? 0) < 0) refuse('out-of-range', `budget.${key}`, 0);
  // A limit that nothing can be held against would be no limit.
  if (budget.minutes !== undefined && budget.minutesPerRun === undefined)
    refuse('missing', 'budget.minutesPerRun');
  if (budget.money !== undefined && budget.costPerRun === undefined) refuse('missing', 'budget.costPerRun');
}

function checkNoise({ noise }: Brief): void {
  if (noise === null) return;
  checkPositive(noise.sd, 'noise.sd');
  checkPositive(noise.df, 'noise.df');
  if ((noise.setup ?? 0) < 0) refuse('out-of-range', 'noise.setup', 0);
}

function checkBlocks({ blocks }: Brief): void {
  if (blocks === undefined) return;
  checkWhole(blocks.count, 'blocks.count');
  checkWhole(blocks.runsEach, 'blocks.runsEach');
  if (blocks.count > 4) refuse('too-many-blocks', 'blocks.count', 4);
  if (blocks.count === 3) refuse('out-of-range', 'blocks.count', 2);
}

function checkRules(brief: Brief): void {
  const letters = lettersUpTo(brief.factors.length);
  for (const [index, rule] of brief.forbidden.entries()) {
    const named = Object.keys(rule);
    if (named.length === 0) refuse('empty-rule', `forbidden.${index}`);
    const unknown = named.find((letter) => !letters.includes(letter));
    if (unknown !== undefined) refuse('unknown-letter', `forbidden.${index}.${unknown}`);
    const upToHere = { ...brief, forbidden: brief.forbidden.slice(0, index + 1) };
    if (!canShowMainEffects(listAllowedCorners(upToHere), letters.length))
      refuse('everything-forbidden', `forbidden.${index}`);
  }
}

function checkNamed(text: string, field: string): void {
  if (fold(text) === '') refuse('empty-name', field);
}

function checkPositive(value: number | undefined, field: string): void {
  if (value !== undefined && !(value > 0)) refuse('not-positive', field);
}

function checkWhole(value: number | undefined, field: string): void {
  if (value === undefined) return;
  if (value < 1) refuse('not-positive', field, 1);
  if (!Number.isInteger(value)) refuse('not-whole', field, Math.round(value));
}

function checkShare(value: number | undefined, field: string): void {
  if (value !== undefined && !(value >= 0 && value <= 1)) refuse('out-of-range', field, value < 0 ? 0 : 1);
}

function fold(text: string): string {
  return text.trim().toLowerCase();
}

function refuse(code: PlanErrorCode, field: string, need: number | null = null): never {
  throw new PlanError({ code, field, need });
}
