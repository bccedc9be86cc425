import type { AdviceFact, Fact } from '../../../lib/doe/index.ts';
import { callKinds, sayCall, sayDepends } from '../call-words.ts';
import { factsOf, type PageWording } from './page-wording.ts';

/** A change with its words, signed so that better is positive. */
export interface WhyRow {
  key: string;
  name: string;
  size: string;
  call: string;
  change: number;
  from: number;
  to: number;
}

type Interval = [number, number] | null;

/** An interval turned so that better is positive; without one the line runs off both ends. */
function turned(direction: 1 | -1, change: number, interval: Interval) {
  const [low, high] = interval ?? [Number.NEGATIVE_INFINITY, Number.POSITIVE_INFINITY];
  return {
    change: direction * change,
    from: direction === 1 ? low : -high,
    to: direction === 1 ? high : -low,
  };
}

function rowsOf(fact: Fact, wording: PageWording): WhyRow[] {
  const { direction } = wording.view.bet.basis;
  const key = (fact.refs.terms ?? []).join();
  const [call] = factsOf([fact], ...callKinds);
  if (call !== undefined) {
    const { change, interval } = call.values;
    return [{ key, ...sayCall(call, wording), ...turned(direction, change, interval) }];
  }
  const [depends] = factsOf([fact], 'depends-on-partner');
  if (depends === undefined) return [];
  const [atLow, atHigh] = sayDepends(depends, wording);
  const { partnerLow, partnerLowInterval, partnerHigh, partnerHighInterval } = depends.values;
  return [
    ...(atLow ? [{ key: `${key} low`, ...atLow, ...turned(direction, partnerLow, partnerLowInterval) }] : []),
    ...(atHigh
      ? [{ key: `${key} high`, ...atHigh, ...turned(direction, partnerHigh, partnerHighInterval) }]
      : []),
  ];
}

function isWorthARow(fact: Fact): boolean {
  return fact.kind === 'matters' || fact.kind === 'real-but-small';
}

/** Every setting, and the pairs that have an effect; largest change first. */
export function whyRows(wording: PageWording): WhyRow[] {
  const { settings, pairs } = wording.view.verdict;
  return [...settings, ...pairs.filter(isWorthARow)]
    .flatMap((fact) => rowsOf(fact, wording))
    .sort((one, other) => Math.abs(other.change) - Math.abs(one.change));
}

/** The other pairs, for whoever opens them. */
export function otherPairs(wording: PageWording): WhyRow[] {
  return wording.view.verdict.pairs
    .filter((fact) => !isWorthARow(fact))
    .flatMap((fact) => rowsOf(fact, wording));
}

export type PairCorners = Extract<AdviceFact, { kind: 'pair-corners' }>;
