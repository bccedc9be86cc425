/** One reading that counts: a figure, or rejects out of a lot. */
export interface CountedReading {
  /** Place of the result: 0 is the main one. */
  result: number;
  part: number;
  value: number | null;
  rejects: number | null;
  lot: number | null;
}

/** A run as a verdict reads it, in the order of running. */
export interface VerdictRun {
  id: string;
  number: number;
  place: number;
  block: number;
  wholePlot: number | null;
  group: string;
  center: boolean;
  coded: number[];
  planned: (number | string)[];
  /** What the dials were really set to, where that differs. */
  actual: (number | string)[] | null;
  end: 'measured' | 'notRun' | 'failed' | 'beyondGauge' | null;
  readings: CountedReading[];
}
