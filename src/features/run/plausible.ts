/** What of a result would surprise nobody. */
export interface Range {
  low: number;
  high: number;
}

/** How far beyond what was seen a trial may take a result, in widths of what was seen: settings are moved on purpose. */
const leeway = 3;
/** Readings needed before they say something of the result by themselves. */
const fewestSeen = 3;

/**
 * What of a result would surprise nobody, from figures seen before. A guard against slips of the thumb, not a judgment:
 * whatever lies outside is asked back once and then counts.
 * @param seen figures of the result: today's lowest, highest, usual and past ones
 * @param change the change of the result that the trial looks for; 0 where nobody said
 * @returns null where too little is known
 */
export function guessRange(seen: readonly number[], change: number): Range | null {
  if (seen.length < 2 && change === 0) return null;
  if (seen.length === 0) return null;
  const low = Math.min(...seen);
  const high = Math.max(...seen);
  const width = Math.max(high - low, 2 * change, Math.max(Math.abs(low), Math.abs(high)) * 0.1);
  return { low: Math.min(low - leeway * width, low), high: high + leeway * width };
}

/** Widens a range by the readings that count already; from a few readings on they make a range where none was known. */
export function widenRange(range: Range | null, readings: readonly number[]): Range | null {
  if (range === null) return readings.length < fewestSeen ? null : guessRange(readings, 0);
  const seen = guessRange(readings.length < fewestSeen ? [] : readings, 0);
  return seen === null
    ? range
    : { low: Math.min(range.low, seen.low), high: Math.max(range.high, seen.high) };
}

export function isFarOff(value: number, range: Range | null): boolean {
  return range !== null && (value < range.low || value > range.high);
}
