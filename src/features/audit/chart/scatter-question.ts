export interface ScatterPoint {
  x: number;
  y: number;
  /** Stands beside the mark. */
  label?: string | undefined;
  /** Height of a small bar above or below the mark: its own limit. */
  bar?: number | undefined;
}

/** What a chart of points shows. */
export interface ScatterQuestion {
  /** Read out in place of the drawing. */
  title: string;
  xLabel: string;
  yLabel: string;
  points: readonly ScatterPoint[];
  /** Straight lines across the chart with their words at the end. */
  lines?: readonly { axis: 'x' | 'y'; value: number; label: string }[];
  /** Starts both axes at zero though no mark stands there. */
  fromZero?: 'both' | undefined;
  tick: (value: number) => string;
}
