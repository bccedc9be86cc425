import {
  type BestBet,
  type Brief,
  type Fact,
  letterAt,
  moveWindow,
  type NumberFactor,
} from '../../lib/doe/index.ts';
import type { FollowReason } from './follow-reason.ts';
import { factsOf } from './page/page-wording.ts';

/** A range on the dial. */
export interface DialRange {
  low: number;
  high: number;
}

/** Half of the half range: the new window overlaps the old one by three quarters, so that both can be compared. */
const step = 0.5;

/** To the dial's step, without the dust of binary fractions. */
function onDial({ step: stepOfDial, low }: NumberFactor, value: number): number {
  const whole = stepOfDial === undefined ? value : low + Math.round((value - low) / stepOfDial) * stepOfDial;
  return Number(whole.toPrecision(10));
}

function middleOf({ low, high }: DialRange): number {
  return (low + high) / 2;
}

/** What failed lies at these ends; the range keeps its other half. Where no cause was found, both ends come in. */
function narrowed(factor: NumberFactor, letter: string, trust: readonly Fact[]): DialRange {
  const cause = factsOf(trust, 'failed-together').find(({ refs }) => refs.factors?.includes(letter));
  const level = cause?.values.levels[cause.refs.factors?.indexOf(letter) ?? -1];
  const quarter = (factor.high - factor.low) / 4;
  if (level === undefined)
    return { low: onDial(factor, factor.low + quarter), high: onDial(factor, factor.high - quarter) };
  return level > 0
    ? { low: factor.low, high: onDial(factor, middleOf(factor)) }
    : { low: onDial(factor, middleOf(factor)), high: factor.high };
}

/** Half as wide, around the best that was found, inside what was tried. */
function around(factor: NumberFactor, best: number): DialRange {
  const half = (factor.high - factor.low) / 4;
  const center = Math.min(factor.high - half, Math.max(factor.low + half, best));
  return { low: onDial(factor, center - half), high: onDial(factor, center + half) };
}

/**
 * The ranges of the trial that follows, by place; null: as they were. What is usual stays inside, for the settings to go
 * back to are among those of every trial.
 */
export function nextRanges(question: {
  brief: Brief;
  bet: BestBet;
  reason: FollowReason;
  next: readonly Fact[];
  trust: readonly Fact[];
  usual: readonly (number | string)[];
}): (DialRange | null)[] {
  const { brief, bet, reason, next, trust, usual } = question;
  const named = new Set(next.filter(({ kind }) => kind === reason).flatMap(({ refs }) => refs.factors ?? []));
  const steps = brief.factors.map((_, place) => {
    const move = factsOf(next, 'move-window').find(({ refs }) => refs.factors?.[0] === letterAt(place));
    return move ? step * move.values.direction : 0;
  });
  const moved = moveWindow(brief, steps);
  return brief.factors.map((factor, place) => {
    if (factor.kind !== 'number' || !named.has(letterAt(place))) return null;
    const range = rangeFor(factor, place);
    const now = usual[place];
    if (range === null || typeof now !== 'number') return range;
    return { low: Math.min(range.low, now), high: Math.max(range.high, now) };
  });

  function rangeFor(factor: NumberFactor, place: number): DialRange | null {
    if (reason === 'narrow-range') return narrowed(factor, letterAt(place), trust);
    if (reason === 'follow-the-curve') return around(factor, Number(bet.actual[place]));
    const window = moved.factors[place];
    return reason === 'move-window' && window?.kind === 'number'
      ? { low: window.low, high: window.high }
      : null;
  }
}
