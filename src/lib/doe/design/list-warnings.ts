import type { Brief } from '../brief.ts';
import type { Fact } from '../facts.ts';
import { assumeActive } from '../tables/assumed-active.ts';
import type { Candidate } from './candidate.ts';
import { settingsOfRule } from './forbidden.ts';
import { groupBy } from './group-by.ts';
import type { PlanningScale } from './planning-scale.ts';
import { warnOfThinLot } from './thin-lots.ts';
import { letterAt } from './words.ts';

interface Subject {
  brief: Brief;
  candidate: Candidate;
  scale: PlanningScale;
}

/** What a plan cannot do, and what its promises rest on. */
export function listWarnings(subject: Subject): Fact[] {
  return [
    ...warnOfTies(subject),
    ...warnOfBlocks(subject),
    ...warnOfHardSettings(subject),
    ...warnOfError(subject),
    ...warnOfMiddles(subject),
    ...warnOfRules(subject),
    ...warnOfReadings(subject.brief),
  ];
}

function warnOfTies({ candidate: { structure } }: Subject): Fact[] {
  const emptied = structure.irregular?.emptied ?? [];
  const facts: Fact[] = [];
  const mains: string[] = [];
  for (const { term, with: partners } of structure.aliases) {
    const pairs = partners
      .map((partner) => partner.term)
      .filter((other) => other.length === 2 && !emptied.includes(other));
    if (term.length === 1 && pairs.length > 0) mains.push(term);
    if (term.length === 2 && pairs.length > 0)
      facts.push({ kind: 'pairs-tied', values: {}, refs: { terms: [term, ...pairs] } });
  }
  if (mains.length === 0) return facts;
  return [
    {
      kind: 'main-effects-tied-to-pairs',
      values: { resolution: structure.resolution },
      refs: { terms: mains },
    },
    ...facts,
  ];
}

function warnOfBlocks({ brief, candidate: { structure, rows } }: Subject): Fact[] {
  const facts: Fact[] = [];
  const { confoundedWithBlocks: terms, blocks } = structure;
  if (terms.length > 0) facts.push({ kind: 'hidden-by-blocks', values: { blocks }, refs: { terms } });
  const runsEach = brief.blocks?.runsEach;
  const needed = Math.max(...groupBy(rows, (row) => row.block).map((block) => block.length));
  if (runsEach !== undefined && needed > runsEach)
    facts.push({ kind: 'block-too-small', values: { runsEach, needed }, refs: {} });
  return facts;
}

function warnOfHardSettings({ brief, candidate: { structure, rows, errorPlan } }: Subject): Fact[] {
  const factors = brief.factors.flatMap((factor, index) => (factor.hardToChange ? [letterAt(index)] : []));
  if (factors.length === 0) return [];
  if (structure.wholePlots === undefined)
    return [{ kind: 'hard-settings-shuffled', values: {}, refs: { factors } }];
  const whole = errorPlan.strata?.find(({ name }) => name === 'whole');
  if (structure.wholePlots.judged && whole !== undefined && whole.rung !== 'none') return [];
  const wholePlots = new Set(rows.map((row) => row.wholePlot)).size;
  return [{ kind: 'hard-setting-not-judged', values: { wholePlots }, refs: { factors } }];
}

function warnOfError({ candidate: { errorPlan }, scale, brief }: Subject): Fact[] {
  const facts: Fact[] = [];
  if (errorPlan.rung === 'none') facts.push({ kind: 'no-error-estimate', values: {}, refs: {} });
  if (errorPlan.rung.startsWith('pseudo'))
    facts.push({
      kind: 'error-from-small-effects',
      values: { assumedActive: assumeActive(errorPlan.contrasts) },
      refs: {},
    });
  if (scale.unit === 'noise sd') facts.push({ kind: 'noise-unknown', values: {}, refs: {} });
  if (scale.assumedSetup !== null)
    facts.push({ kind: 'setup-assumed', values: { setup: scale.assumedSetup }, refs: {} });
  if (brief.response.kind !== 'measured' && brief.noise === null)
    facts.push({ kind: 'counting-noise-only', values: {}, refs: {} });
  return facts;
}

function warnOfMiddles({ brief, candidate: { centerPoints } }: Subject): Fact[] {
  const lettersOf = (kind: 'number' | 'choice') =>
    brief.factors.flatMap((factor, index) => (factor.kind === kind ? [letterAt(index)] : []));
  const numbers = lettersOf('number');
  const choices = lettersOf('choice');
  if (numbers.length === 0) return [];
  if (centerPoints === 0) return [{ kind: 'bend-not-shown', values: {}, refs: { factors: numbers } }];
  if (choices.length < 2) return [];
  return [{ kind: 'bend-at-usual-choices', values: {}, refs: { factors: choices } }];
}

function warnOfRules({ brief, candidate: { structure, rows } }: Subject): Fact[] {
  const facts: Fact[] = [];
  const middles = rows.filter((row) => row.center);
  for (const [rule, levels] of brief.forbidden.entries()) {
    const settings = settingsOfRule(levels);
    const factors = settings.map(letterAt);
    if (settings.length === 2 && structure.irregular)
      facts.push({
        kind: 'pair-emptied-by-rule',
        values: { rule },
        refs: { terms: [factors.toSorted().join('')] },
      });
    if (structure.irregular) facts.push(...offerNarrowing(brief, rule, settings));
    const touches = middles.some((row) =>
      settings.every((setting) => (row.x[setting] ?? 0) * (levels[letterAt(setting)] ?? 0) >= 0),
    );
    if (touches) facts.push({ kind: 'middle-touches-rule', values: { rule }, refs: { factors } });
  }
  const lowest = Math.min(1, ...(structure.irregular?.efficiencies ?? []).map(({ relative }) => relative));
  const terms = (structure.irregular?.efficiencies ?? [])
    .filter(({ relative }) => relative < 0.99)
    .map(({ term }) => term);
  if (terms.length > 0)
    facts.push({ kind: 'uneven-corners', values: { lowestEfficiency: lowest }, refs: { terms } });
  return facts;
}

/** With one range of a rule cut at its present middle, no point of the new range is beyond that middle. */
function offerNarrowing(brief: Brief, rule: number, settings: readonly number[]): Fact[] {
  return settings.flatMap((setting): Fact[] => {
    const factor = brief.factors[setting];
    const level = brief.forbidden[rule]?.[letterAt(setting)];
    if (factor?.kind !== 'number' || level === undefined) return [];
    const middle = (factor.low + factor.high) / 2;
    const range = level > 0 ? { low: factor.low, high: middle } : { low: middle, high: factor.high };
    return [
      { kind: 'narrow-a-range-first', values: { rule, ...range }, refs: { factors: [letterAt(setting)] } },
    ];
  });
}

function warnOfReadings(brief: Brief): Fact[] {
  const facts: Fact[] = [];
  for (const [result, response] of [brief.response, ...brief.watch].entries()) {
    const parts = response.partsPerRun ?? 1;
    if (response.kind === 'measured' && parts > 1)
      facts.push({ kind: 'short-term-spread-only', values: { parts }, refs: { results: [result] } });
    facts.push(...warnOfThinLot(response, result));
  }
  return facts;
}
