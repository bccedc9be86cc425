import { ScatterPlot, type ScatterPlotCustomSvgLayer, type ScatterPlotDatum } from '@nivo/scatterplot';
import { renderToStaticMarkup } from 'react-dom/server';
import type { ScatterPoint, ScatterQuestion } from './scatter-question.ts';

type Point = ScatterPoint & ScatterPlotDatum;

const width = 560;
const height = 320;
const margin = { top: 16, right: 24, bottom: 56, left: 76 };

/** The ends of an axis with a little room, so that no mark lies on the frame. */
function endsOf(values: readonly number[], fromZero: boolean): { min: number; max: number } {
  const known = values.filter(Number.isFinite);
  const low = fromZero ? Math.min(0, ...known) : Math.min(...known);
  const high = Math.max(...known);
  const room = (high - low || Math.abs(high) || 1) * 0.08;
  return { min: fromZero && low === 0 ? 0 : low - room, max: high + room };
}

const labels: ScatterPlotCustomSvgLayer<Point> = ({ nodes, xScale, yScale }) => (
  <g>
    {nodes.map((node) => {
      const { label, bar, x } = node.data;
      return (
        <g key={node.id}>
          {bar !== undefined && (
            <line
              className="chart-bar"
              x1={Number(xScale(x)) - 7}
              x2={Number(xScale(x)) + 7}
              y1={Number(yScale(bar))}
              y2={Number(yScale(bar))}
            />
          )}
          {label && (
            <text className="chart-point-label" x={node.x - 9} y={node.y + 4} textAnchor="end">
              {label}
            </text>
          )}
        </g>
      );
    })}
  </g>
);

/**
 * A chart of points as SVG, drawn on the server. The library writes colors and sizes as `style`, which the content policy
 * of our pages refuses: they are taken out, and the style sheet says how a chart looks.
 */
export function drawScatter({
  title,
  points,
  lines = [],
  tick,
  fromZero,
  xLabel,
  yLabel,
}: ScatterQuestion): string {
  const along = (axis: 'x' | 'y') => [
    ...points.map((point) => point[axis]),
    ...lines.filter((line) => line.axis === axis).map(({ value }) => value),
    ...(axis === 'y' ? points.flatMap(({ bar }) => bar ?? []) : []),
  ];
  const drawn = renderToStaticMarkup(
    <ScatterPlot<Point>
      width={width}
      height={height}
      margin={margin}
      data={[{ id: 'points', data: [...points] }]}
      xScale={{ type: 'linear', ...endsOf(along('x'), fromZero === 'both') }}
      yScale={{ type: 'linear', ...endsOf(along('y'), fromZero === 'both') }}
      nodeSize={9}
      animate={false}
      isInteractive={false}
      useMesh={false}
      enableGridX={false}
      enableGridY={false}
      axisTop={null}
      axisRight={null}
      axisBottom={{
        tickValues: 5,
        format: (value) => tick(Number(value)),
        legend: xLabel,
        legendPosition: 'middle',
        legendOffset: 42,
      }}
      axisLeft={{
        tickValues: 5,
        format: (value) => tick(Number(value)),
        legend: yLabel,
        legendPosition: 'middle',
        legendOffset: -62,
      }}
      markers={lines.map(({ axis, value, label }) => ({
        axis,
        value,
        legend: label,
        legendPosition: axis === 'y' ? 'top-left' : 'top-right',
      }))}
      layers={['grid', 'axes', 'markers', 'nodes', labels]}
      role="img"
      ariaLabel={title}
    />,
  );
  return drawn.replace(/ style="[^"]*"/g, '');
}
