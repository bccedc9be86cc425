import type { ResponseSpec } from '../../lib/doe/index.ts';
import { roundingStep, roundTo, stepThatShows } from './rounding.ts';
import type { Wording } from './wording.ts';

type Interval = readonly [number, number];

/** How figures of one result are written: with its unit, or as a count out of the lot. */
export interface ResultWords {
  spec: ResponseSpec;
  /** One figure of the result; how far it may be off decides its rounding. */
  figure(value: number, about?: { interval?: Interval | null; manner?: 'rough' | 'fine' }): string;
  range(interval: Interval, manner?: 'rough' | 'fine'): string;
  /** "6 N higher (4 N to 8 N)" */
  change(change: number, interval: Interval | null): string;
  /** "6 N higher", as far as it can be said without its range. */
  roughChange(change: number, interval: Interval): string;
  /** "6 N": how big a change is, without its sign. */
  size(change: number, interval: Interval | null): string;
}

export function halfWidth(interval: Interval | null | undefined): number | null {
  return interval ? Math.abs(interval[1] - interval[0]) / 2 : null;
}

export function specOf({ view }: Pick<Wording, 'view'>, result: number): ResponseSpec {
  return view.brief.watch[result - 1] ?? view.brief.response;
}

/** @param result place of the result: 0 is the main one */
export function resultWords(wording: Wording, result = 0): ResultWords {
  const { t, formats } = wording;
  const spec = specOf(wording, result);
  const { unit, kind } = spec;
  const lotSize = kind !== 'measured' && (spec.lotSize ?? 1) > 1 ? (spec.lotSize ?? 1) : null;
  // The core counts rejects as a share of the lot; people count parts.
  const scale = kind === 'rejects' ? (lotSize ?? 1) : 1;
  const write = (value: number, step: number) => {
    const rounded = roundTo(value, step);
    return formats.number(rounded.value, rounded.digits);
  };
  const withUnit = (number: string) => {
    if (lotSize !== null) return t('verdict:figure.counted', { number, lot: formats.number(lotSize) });
    return unit === '' ? number : t('verdict:figure.measured', { number, unit });
  };
  const between = (from: string, to: string) => {
    if (lotSize !== null) return t('verdict:range.counted', { from, to, lot: formats.number(lotSize) });
    return unit === ''
      ? t('verdict:range.bare', { from, to })
      : t('verdict:range.measured', { from, to, unit });
  };
  const stepOfChange = (change: number, interval: Interval | null) =>
    stepThatShows(
      [change, ...(interval ?? [])].map((each) => each * scale),
      roundingStep(change * scale, interval && (halfWidth(interval) ?? 0) * scale, 'fine'),
    );
  const size = (change: number, interval: Interval | null) =>
    withUnit(write(Math.abs(change) * scale, stepOfChange(change, interval)));

  return {
    spec,
    figure(value, { interval = null, manner = 'rough' } = {}) {
      const spread = interval && (halfWidth(interval) ?? 0) * scale;
      return withUnit(write(value * scale, roundingStep(value * scale, spread, manner)));
    },
    range(interval, manner = 'rough') {
      const spread = (halfWidth(interval) ?? 0) * scale;
      const step = roundingStep(interval[1] * scale, spread, manner);
      return between(write(interval[0] * scale, step), write(interval[1] * scale, step));
    },
    size,
    roughChange(change, interval) {
      const spread = (halfWidth(interval) ?? 0) * scale;
      const step = stepThatShows([change * scale], roundingStep(change * scale, spread, 'rough'));
      const whole = Math.abs(change) * scale;
      // Two figures of one change on a page must not look like two changes.
      const isFar = Math.abs(Math.round(whole / step) * step - whole) > 0.05 * whole;
      const amount = withUnit(write(whole, isFar ? stepOfChange(change, interval) : step));
      return t(`verdict:change.${change < 0 ? 'lower' : 'higher'}.alone`, { amount });
    },
    change(change, interval) {
      const amount = size(change, interval);
      if (change === 0 && interval === null) return t('verdict:change.none');
      const way = change < 0 ? 'lower' : 'higher';
      if (interval === null) return t(`verdict:change.${way}.alone`, { amount });
      const step = stepOfChange(change, interval);
      const [low, high] = interval.map((end) => write(Math.abs(end) * scale, step));
      if (interval[0] < 0 && interval[1] > 0)
        return t(`verdict:change.${way}.across`, {
          amount,
          low: withUnit(low ?? ''),
          high: withUnit(high ?? ''),
        });
      const ends = change < 0 ? between(high ?? '', low ?? '') : between(low ?? '', high ?? '');
      return t(`verdict:change.${way}.within`, { amount, range: ends });
    },
  };
}
