import { useId } from 'react';
import { placeOnTrack, type TrackDomain } from './track-scale.ts';

export interface EffectTrackValues {
  /** Signed so that better is positive, whatever "better" means for the result. */
  readonly change: number;
  /** The ends of its interval, in the same sense. */
  readonly from: number;
  readonly to: number;
}

interface EffectTrackProps extends EffectTrackValues {
  /** The smallest difference worth having; the band reaches from minus this to plus this. */
  readonly worthHaving: number;
  /** The same for all tracks of a page. */
  readonly domain: TrackDomain;
}

/** Room for the cap at the end of the longest interval. */
const endMargin = 0.02;
const height = 44;
const middle = height / 2;

/** A symmetric domain that holds every interval and the band, so that zero lies in the middle of each track. */
export function findEffectDomain(effects: readonly EffectTrackValues[], worthHaving: number): TrackDomain {
  const ends = effects.flatMap(({ change, from, to }) => [Math.abs(change), Math.abs(from), Math.abs(to)]);
  const reach = Math.max(Math.abs(worthHaving), ...ends.filter(Number.isFinite)) || 1;
  return { from: -reach, to: reach };
}

/**
 * A change as a bar from zero, its interval as a thin line with ends, over the band that is not worth having. Better lies
 * right. Hidden from screen readers: the row says change, interval, call and how sure in words. An interval without a
 * finite end runs off the track and has no cap there.
 */
export function EffectTrack({ change, from, to, worthHaving, domain }: EffectTrackProps) {
  const hatch = useId();
  const place = (value: number) => placeOnTrack(value, domain, endMargin);
  const width = (start: number, end: number) => `${Math.round(Math.abs(end - start) * 100) / 100}%`;
  const [zero, tip] = [place(0), place(change)];
  const [bandStart, bandEnd] = [place(-worthHaving), place(worthHaving)];
  const reach = [from, to].map((end) => (Number.isFinite(end) ? place(end) : end < 0 ? 0 : 100));
  const [start = 0, end = 100] = reach;

  return (
    <svg className="effect-track" width="100%" height={height} aria-hidden="true" focusable="false">
      <defs>
        <pattern id={hatch} width={7} height={7} patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
          <line x1={0} x2={0} y1={0} y2={7} className="effect-hatch" />
        </pattern>
      </defs>
      <rect
        x={`${bandStart}%`}
        y={3}
        width={width(bandStart, bandEnd)}
        height={height - 6}
        fill={`url(#${hatch})`}
        className="effect-band"
      />
      <rect
        x={`${Math.min(zero, tip)}%`}
        y={middle - 7}
        width={width(zero, tip)}
        height={14}
        className="effect-bar"
      />
      <line x1={`${zero}%`} x2={`${zero}%`} y1={0} y2={height} className="effect-zero" />
      <line x1={`${start}%`} x2={`${end}%`} y1={middle} y2={middle} className="effect-interval" />
      {Number.isFinite(from) && (
        <line x1={`${start}%`} x2={`${start}%`} y1={middle - 6} y2={middle + 6} className="effect-interval" />
      )}
      {Number.isFinite(to) && (
        <line x1={`${end}%`} x2={`${end}%`} y1={middle - 6} y2={middle + 6} className="effect-interval" />
      )}
    </svg>
  );
}
