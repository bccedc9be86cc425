import { TrackAnchor } from './TrackAnchor.tsx';

interface SettingTrackFlagProps {
  readonly label: string;
  /** Of the track's width. */
  readonly percent: number;
  readonly lineY: number;
}

/** In the face for figures at 15 px every digit is 9 px wide; point, comma and minus are narrower, so this is enough room. */
const digitWidth = 9;

/** The value to try: a flag on a pole that stands on the track, flying toward the middle of it. */
export function SettingTrackFlag({ label, percent, lineY }: SettingTrackFlagProps) {
  const side = percent > 50 ? -1 : 1;
  const length = label.length * digitWidth + 22;
  const notch = side * (length - 6);
  return (
    <TrackAnchor percent={percent}>
      <path d={`M0 1V${lineY}`} className="track-pole" />
      <path d={`M0 0H${side * length}L${notch} 10.5 ${side * length} 21H0Z`} className="track-flag" />
      <text x={side * ((length - 6) / 2)} y={16} textAnchor="middle" className="track-flag-words">
        {label}
      </text>
    </TrackAnchor>
  );
}
