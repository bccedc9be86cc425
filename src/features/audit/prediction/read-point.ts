import { parseTypedNumber } from '../../../i18n/format.ts';
import { type Brief, encode, isForbidden, letterAt, usualValues } from '../../../lib/doe/index.ts';

/** A point that somebody asks about, as typed and as the core takes it. */
export interface AskedPoint {
  /** What stands in each field. */
  typed: string[];
  /** By letter: why a field was not taken. */
  faults: Record<string, 'not-a-number' | 'outside'>;
  /** null while a field is not taken. */
  coded: number[] | null;
  isForbidden: boolean;
}

const SLACK = 1e-9;

/** Reads the point of an address; today's settings where nothing was typed. */
export function readPoint(brief: Brief, query: URLSearchParams): AskedPoint {
  const usual = usualValues(brief);
  const faults: AskedPoint['faults'] = {};
  const typed = brief.factors.map((_, place) => query.get(letterAt(place)) ?? String(usual[place] ?? ''));
  const coded = brief.factors.map((factor, place) => {
    const letter = letterAt(place);
    const text = typed[place] ?? '';
    if (factor.kind === 'choice') {
      if (text !== factor.low && text !== factor.high) faults[letter] = 'outside';
      return text === factor.high ? 1 : -1;
    }
    const value = parseTypedNumber(text);
    if (value === null) {
      faults[letter] = 'not-a-number';
      return 0;
    }
    const at = encode(factor, value);
    if (Math.abs(at) > 1 + SLACK) faults[letter] = 'outside';
    return at;
  });
  const isTaken = Object.keys(faults).length === 0;
  return {
    typed,
    faults,
    coded: isTaken ? coded : null,
    isForbidden: isTaken && isForbidden(brief, coded),
  };
}
