import type { Fact } from '../facts.ts';
import { catalogue } from './catalogue.ts';
import { type CoachDraft, type DraftFactor, readNumber, readPositive } from './draft.ts';
import { buildRegularPlan } from './regular-plan.ts';
import { letterAt } from './words.ts';

const fewestMiddles = 3;
/** Fewer corners than this show no setting twice at each of its ends. */
const fewestCorners = 4;

/** What is odd about the settings seen together: twins, and too many of them. */
export function coachSettings({ factors, budget }: CoachDraft): Fact[] {
  const settings = factors ?? [];
  return [...listTwins(settings), ...countSettings(settings, readPositive(budget?.maxRuns))];
}

function listTwins(settings: readonly DraftFactor[]): Fact[] {
  return settings.flatMap((first, index) =>
    settings.slice(index + 1).flatMap((second, distance): Fact[] => {
      const because = sameName(first, second) ? 'name' : sameValues(first, second) ? 'values' : null;
      if (because === null) return [];
      const letters = [letterAt(index), letterAt(index + 1 + distance)];
      return [{ kind: 'settings-alike', values: { because }, refs: { factors: letters } }];
    }),
  );
}

function sameName(first: DraftFactor, second: DraftFactor): boolean {
  const names = [first.name, first.panelName].map(fold);
  return [second.name, second.panelName].map(fold).some((name) => name !== '' && names.includes(name));
}

/** The same ends in the same unit, and nothing said that today they stand at different values. */
function sameValues(first: DraftFactor, second: DraftFactor): boolean {
  if ((first.kind ?? 'number') !== (second.kind ?? 'number')) return false;
  const sameUnit =
    first.kind === 'choice' || (fold(first.unit) !== '' && fold(first.unit) === fold(second.unit));
  const sameEnds = [first.low, first.high].every((end, which) => {
    const other = [second.low, second.high][which];
    return isGiven(end) && fold(end) === fold(other);
  });
  const apartToday = isGiven(first.usual) && isGiven(second.usual) && first.usual !== second.usual;
  return sameUnit && sameEnds && !apartToday;
}

function isGiven(value: unknown): boolean {
  return readNumber(value) !== undefined || fold(value) !== '';
}

/** Upper and lower case, spaces and hyphens do not make another name. */
function fold(value: unknown): string {
  if (typeof value === 'number') return Number.isFinite(value) ? String(value) : '';
  return typeof value === 'string' ? value.toLowerCase().replace(/[\s_.-]+/g, '') : '';
}

function countSettings(settings: readonly DraftFactor[], runs: number | undefined): Fact[] {
  const needs = needsFor(settings.length);
  if (runs === undefined || needs === null) return [];
  const middles = settings.every((factor) => factor.kind === 'choice') ? 0 : fewestMiddles;
  const neededApart = needs.apart + middles;
  if (runs >= neededApart) return [];
  const mostApart = settings.filter((_, index) => {
    const need = needsFor(index + 1);
    return need !== null && need.apart + middles <= runs;
  }).length;
  const values = { settings: settings.length, runs, neededToFit: needs.atAll, neededApart, mostApart };
  return [{ kind: 'many-settings-for-runs', values, refs: {} }];
}

/** Corners of the smallest plan for so many settings, and of the smallest that ties no main effect to a pair; null beyond the catalogue. */
function needsFor(settings: number): { atAll: number; apart: number } | null {
  const plans = catalogue.filter((entry) => entry.k === settings);
  const apart = plans.filter(({ k, generators }) => buildRegularPlan(k, generators).resolution >= 4);
  if (plans.length === 0) return null;
  const least = (entries: typeof plans) =>
    Math.max(fewestCorners, Math.min(...entries.map(({ runs }) => runs)));
  return { atAll: least(plans), apart: least(apart) };
}
