import { TrackAnchor } from '../../../components/ui/TrackAnchor.tsx';
import { placeOnTrack } from '../../../components/ui/track-scale.ts';
import { stackDots } from './stack-dots.ts';

interface Props {
  readonly figures: readonly number[];
  readonly write: (figure: number) => string;
  /** The whole strip in one sentence. */
  readonly label: string;
}

const lineY = 72;
const dot = 5;
/** More would grow out of the strip; the words say how many there are. */
const mostInStack = 6;

/** Readings from left to right, equal ones on top of each other: how far a process moves by itself. */
export function DotStrip({ figures, write, label }: Props) {
  const [low, high] = [Math.min(...figures), Math.max(...figures)];
  const spare = (high - low) / 20 || Math.abs(low) / 20 || 1;
  const domain = { from: low - spare, to: high + spare };
  const place = (figure: number) => placeOnTrack(figure, domain, 0.06);
  const ends = low === high ? [low] : [low, high];
  return (
    <svg className="setting-track" width="100%" height={104} role="img" aria-label={label}>
      <line x1="0%" x2="100%" y1={lineY} y2={lineY} className="track-line" />
      {stackDots(figures, domain).map(({ figure, level, key }) => (
        <circle
          key={key}
          cx={`${place(figure)}%`}
          cy={lineY - dot - 2 - Math.min(level, mostInStack - 1) * (2 * dot + 1)}
          r={dot}
          className="track-dot"
        />
      ))}
      {ends.map((figure) => (
        <TrackAnchor key={figure} percent={place(figure)}>
          <text x={0} y={lineY + 22} textAnchor="middle" className="track-now">
            {write(figure)}
          </text>
        </TrackAnchor>
      ))}
    </svg>
  );
}
