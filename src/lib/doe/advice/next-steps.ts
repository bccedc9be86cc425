import type { Brief } from '../brief.ts';
import type { Fact } from '../facts.ts';
import { planCheckRuns } from './check-runs.ts';
import type { Failures } from './failures.ts';
import type { BestBet } from './verdict.ts';

export interface NextStepQuestion {
  brief: Brief;
  bet: BestBet | null;
  failures: Failures;
  missing: readonly number[];
  calls: readonly Fact[];
  details: readonly Fact[];
  trust: readonly Fact[];
}

/** What to do next, most urgent first: mend the trial, check the gain, learn more. */
export function listNextSteps(question: NextStepQuestion): Fact[] {
  return [
    ...mendTrial(question),
    ...(question.bet === null ? [] : decide(question.bet)),
    ...learnMore(question),
  ];
}

function mendTrial({ failures, missing, trust, brief }: NextStepQuestion): Fact[] {
  const facts: Fact[] = [];
  if (failures.runs.length > 0) {
    const factors = [
      ...new Set(failures.causes.flatMap(({ settings }) => settings.map(({ place }) => letterOf(place)))),
    ].sort();
    const numbers = factors.filter((letter) => kindOf(brief, letter) === 'number');
    facts.push({ kind: 'narrow-range', values: {}, refs: { factors: numbers, runs: failures.runs } });
  }
  if (missing.length > 0)
    facts.push({ kind: 'run-missing-now', values: { runs: missing.length }, refs: { runs: [...missing] } });
  const odd = trust.flatMap((fact) => (fact.kind === 'odd-reading' ? (fact.refs.runs ?? []) : []));
  if (odd.length > 0) facts.push({ kind: 'measure-again', values: {}, refs: { runs: odd } });
  return facts;
}

function decide(bet: BestBet): Fact[] {
  if (bet.keepToday) return [{ kind: 'keep-today', values: {}, refs: {} }];
  return [{ kind: 'check-runs', values: planCheckRuns(bet), refs: {} }];
}

function learnMore({ brief, bet, calls, details, trust }: NextStepQuestion): Fact[] {
  const facts: Fact[] = [];
  for (const call of calls) {
    const tied = (call.refs.terms ?? []).filter((term) => term.length <= 2);
    if (call.kind === 'matters' && tied.length > 1)
      facts.push({ kind: 'untie', values: {}, refs: { terms: tied } });
  }
  if (trust.some((fact) => fact.kind === 'bends')) {
    const numbers = brief.factors.flatMap((factor, place) =>
      factor.kind === 'number' ? [letterOf(place)] : [],
    );
    facts.push({ kind: 'follow-the-curve', values: {}, refs: { factors: numbers } });
  }
  if (bet !== null && !bet.keepToday) facts.push(...moveWindows(brief, bet, calls));
  const settling = details.flatMap((fact) => (fact.kind === 'would-settle' ? [fact.values.runs] : []));
  if (settling.length > 0)
    facts.push({ kind: 'repeat-for-certainty', values: { runs: Math.min(...settling) }, refs: {} });
  return facts;
}

/** A number setting that matters and is best at an end of its range may be better still beyond, inside the machine's limits. */
function moveWindows(brief: Brief, bet: BestBet, calls: readonly Fact[]): Fact[] {
  return brief.factors.flatMap((factor, place): Fact[] => {
    const level = bet.coded[place];
    if (factor.kind !== 'number' || (level !== 1 && level !== -1)) return [];
    const letter = letterOf(place);
    const matters = calls.some((call) => call.kind === 'matters' && call.refs.terms?.[0] === letter);
    const end = level === 1 ? factor.high : factor.low;
    const limit = level === 1 ? factor.max : factor.min;
    const hasRoom = limit === undefined || level * (limit - end) > 0;
    return matters && hasRoom
      ? [{ kind: 'move-window', values: { direction: level }, refs: { factors: [letter] } }]
      : [];
  });
}

function letterOf(place: number): string {
  return String.fromCharCode(65 + place);
}

function kindOf(brief: Brief, letter: string): 'number' | 'choice' | undefined {
  return brief.factors[letter.charCodeAt(0) - 65]?.kind;
}
