import type { Fact } from '../facts.ts';
import type { Failures } from './failures.ts';
import type { BestBet } from './verdict.ts';

export interface HeadlineQuestion {
  bet: BestBet;
  calls: readonly Fact[];
  details: readonly Fact[];
  failures: Failures;
  missing: readonly number[];
  planned: number;
}

/** Missing runs beyond this share leave too little to speak of settings. */
const SPOILT = 1 / 3;

/** The first sentence of the verdict. */
export function chooseHeadline({ bet, calls, details, failures, missing, planned }: HeadlineQuestion): Fact {
  if (failures.runs.length > 0)
    return {
      kind: 'some-runs-failed',
      values: { runs: failures.runs.length },
      refs: { runs: failures.runs },
    };
  if (missing.length > SPOILT * planned)
    return {
      kind: 'trial-spoilt',
      values: { missing: missing.length, planned },
      refs: { runs: [...missing] },
    };
  const clash = bet.reasons.find((fact) => fact.kind === 'limits-clash');
  if (clash !== undefined) return clash;
  if (bet.keepToday) return nothingToGain(calls, details);
  const values = { gain: bet.versusUsual, interval: bet.gainInterval };
  const moved = calls.filter((call) => call.kind === 'matters' && call.values.sure !== 'not');
  const factors = [...new Set(moved.flatMap((call) => call.refs.factors ?? []))];
  // A gain is clear only if it is one: settings that are clear may still pull it both ways.
  const isGain = bet.basis.direction === 1 ? bet.gainInterval[0] > 0 : bet.gainInterval[1] < 0;
  if (isGain && moved.some((call) => call.kind === 'matters' && call.values.sure === 'clear'))
    return { kind: 'clear-gain', values, refs: { factors } };
  if (moved.length > 0) return { kind: 'likely-gain', values, refs: { factors } };
  return { kind: 'possible-gain', values, refs: {} };
}

function nothingToGain(calls: readonly Fact[], details: readonly Fact[]): Fact {
  const real = calls.filter((call) => call.kind === 'real-but-small' || call.kind === 'matters');
  if (real.length > 0)
    return {
      kind: 'real-but-too-small',
      values: {},
      refs: { factors: [...new Set(real.flatMap((call) => call.refs.factors ?? []))] },
    };
  if (calls.length > 0 && calls.every((call) => call.kind === 'no-real-difference'))
    return { kind: 'nothing-makes-a-difference', values: {}, refs: {} };
  const settling = details.flatMap((fact) => (fact.kind === 'would-settle' ? [fact.values.runs] : []));
  const runs = settling.length === 0 ? null : Math.min(...settling);
  return { kind: 'nothing-settled', values: { runs }, refs: {} };
}
