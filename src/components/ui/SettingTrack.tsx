import { SettingTrackFlag } from './SettingTrackFlag.tsx';
import { TrackAnchor } from './TrackAnchor.tsx';
import { findSettingDomain, placeOnTrack } from './track-scale.ts';

/** A place on the track with the words that name it, the figure already formatted. */
export interface TrackPoint {
  readonly value: number;
  readonly label: string;
}

interface SettingTrackProps {
  readonly low: TrackPoint;
  readonly high: TrackPoint;
  /** Today's value, such as "now 150". */
  readonly now?: TrackPoint | undefined;
  /** The value to try; its label is the figure alone. */
  readonly next?: TrackPoint | undefined;
  /** Machine limits. An unknown end is dashed. */
  readonly min?: TrackPoint | undefined;
  readonly max?: TrackPoint | undefined;
  /** The whole track in one sentence, for a screen reader. */
  readonly label: string;
}

const lineY = 44;

function isApart(point: TrackPoint | undefined, other: TrackPoint | undefined): point is TrackPoint {
  return point !== undefined && point.value !== other?.value;
}

/**
 * A setting's possible values from left to right: machine limits as the ends, low to high as the window, today's value as a
 * pin below, the value to try as a flag above. Marks lie at a percentage of the width, so words keep their size on any
 * screen; each kind of word has a height of its own, so they do not meet.
 */
export function SettingTrack({ low, high, now, next, min, max, label }: SettingTrackProps) {
  const domain = findSettingDomain({
    low: low.value,
    high: high.value,
    now: now?.value,
    next: next?.value,
    min: min?.value,
    max: max?.value,
  });
  const place = (value: number) => placeOnTrack(value, domain);
  const [start, end] = [place(domain.from), place(domain.to)];
  const [windowStart, windowEnd] = [place(low.value), place(high.value)];

  return (
    <svg className="setting-track" width="100%" height={88} role="img" aria-label={label}>
      <line
        x1={`${start}%`}
        x2={`${windowStart}%`}
        y1={lineY}
        y2={lineY}
        className="track-line"
        strokeDasharray={min ? undefined : '5 5'}
      />
      <line
        x1={`${windowEnd}%`}
        x2={`${end}%`}
        y1={lineY}
        y2={lineY}
        className="track-line"
        strokeDasharray={max ? undefined : '5 5'}
      />
      {min && <line x1={`${start}%`} x2={`${start}%`} y1={lineY - 8} y2={lineY + 8} className="track-end" />}
      {max && <line x1={`${end}%`} x2={`${end}%`} y1={lineY - 8} y2={lineY + 8} className="track-end" />}
      <rect
        x={`${windowStart}%`}
        y={lineY - 8}
        width={`${Math.round((windowEnd - windowStart) * 100) / 100}%`}
        height={16}
        rx={3}
        className="track-window"
      />
      <TrackAnchor percent={windowStart}>
        <text x={-6} y={lineY - 10} textAnchor="end" className="track-value">
          {low.label}
        </text>
      </TrackAnchor>
      <TrackAnchor percent={windowEnd}>
        <text x={6} y={lineY - 10} className="track-value">
          {high.label}
        </text>
      </TrackAnchor>
      {isApart(min, now) && (
        <text x={`${start}%`} y={lineY + 24} textAnchor="middle" className="track-limit">
          {min.label}
        </text>
      )}
      {isApart(max, now) && (
        <text x={`${end}%`} y={lineY + 24} textAnchor="middle" className="track-limit">
          {max.label}
        </text>
      )}
      {now && (
        <TrackAnchor percent={place(now.value)}>
          <path d={`M0 ${lineY + 1} 6.5 ${lineY + 14}H-6.5Z`} className="track-pin" />
          <text x={0} y={lineY + 32} textAnchor="middle" className="track-now">
            {now.label}
          </text>
        </TrackAnchor>
      )}
      {next && <SettingTrackFlag label={next.label} percent={place(next.value)} lineY={lineY} />}
    </svg>
  );
}
