import { Table } from '../../../components/ui/Table.tsx';
import { resultWords } from '../result-words.ts';
import { sayEnd, settingAt, settingName } from '../setting-words.ts';
import { capitalize } from '../wording.ts';
import type { PageWording } from './page-wording.ts';
import type { PairCorners } from './why-rows.ts';

interface Props extends PageWording {
  readonly corners: PairCorners;
}

const width = 360;
const height = 250;
const [left, right, top, bottom] = [70, 220, 24, 200];
/** Words on one side keep this far apart, so that lines which meet stay readable. */
const apart = 40;

function spread(first: number, second: number): [number, number] {
  const gap = second - first;
  if (Math.abs(gap) >= apart) return [first, second];
  const push = (apart - Math.abs(gap)) / 2;
  return gap < 0 ? [first + push, second - push] : [first - push, second + push];
}

/** Two lines, one for each side of the second setting, named at their ends; the same figures stand in a table below. */
export function PairChart({ corners, ...wording }: Props) {
  const { t } = wording;
  const [first = '', second = ''] = corners.refs.factors ?? [];
  const { lowLow, highLow, lowHigh, highHigh } = corners.values;
  const all = [lowLow, highLow, lowHigh, highHigh];
  const interval = [Math.min(...all), Math.max(...all)] as const;
  const { figure, spec } = resultWords(wording);
  const say = (value: number) => figure(value, { interval, manner: 'fine' });
  const room = interval[1] - interval[0] || 1;
  const y = (value: number) => bottom - ((value - interval[0]) / room) * (bottom - top);
  const lines = [
    { level: -1, from: lowLow, to: highLow, className: 'pair-line pair-line-low' },
    { level: 1, from: lowHigh, to: highHigh, className: 'pair-line' },
  ];
  const starts = spread(y(lowLow), y(lowHigh));
  const ends = spread(y(highLow), y(highHigh));
  const title = t('verdict-page:pair.chart', {
    result: capitalize(spec.name),
    first: settingName(wording, first),
    second: settingName(wording, second),
  });
  return (
    <figure className="pair">
      <figcaption>{title}</figcaption>
      <svg className="pair-chart" viewBox={`0 0 ${width} ${height}`} aria-hidden="true" focusable="false">
        <line x1={left} x2={left} y1={top - 8} y2={bottom + 8} className="pair-axis" />
        <line x1={right} x2={right} y1={top - 8} y2={bottom + 8} className="pair-axis" />
        {lines.map(({ level, from, to, className }, index) => (
          <g key={level}>
            <line x1={left} x2={right} y1={y(from)} y2={y(to)} className={className} />
            <circle cx={left} cy={y(from)} r={4.5} className="pair-dot" />
            <circle cx={right} cy={y(to)} r={4.5} className="pair-dot" />
            <text x={left - 10} y={(starts[index] ?? 0) + 5} textAnchor="end">
              {say(from)}
            </text>
            <text x={right + 10} y={(ends[index] ?? 0) + 5}>
              {say(to)}
            </text>
            <text x={right + 10} y={(ends[index] ?? 0) + 22} className="pair-name">
              {settingAt(wording, second, level)}
            </text>
          </g>
        ))}
        <text x={left} y={height - 8} textAnchor="middle">
          {sayEnd(wording, first, -1)}
        </text>
        <text x={(left + right) / 2} y={height - 8} textAnchor="middle" className="pair-name">
          {settingName(wording, first)}
        </text>
        <text x={right} y={height - 8} textAnchor="middle">
          {sayEnd(wording, first, 1)}
        </text>
      </svg>
      <Table
        id={`pair-${first}${second}`}
        caption={title}
        captionHidden
        close
        columns={[
          {
            key: 'side',
            header: settingName(wording, second),
            cell: ({ level }) => sayEnd(wording, second, level),
            rowHeader: true,
          },
          { key: 'low', header: settingAt(wording, first, -1), cell: ({ from }) => say(from), figures: true },
          { key: 'high', header: settingAt(wording, first, 1), cell: ({ to }) => say(to), figures: true },
        ]}
        rows={lines}
        rowKey={({ level }) => String(level)}
        empty=""
      />
    </figure>
  );
}
