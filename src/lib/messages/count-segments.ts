import { isSevenBit, septetsOfLetter } from './gsm-alphabet.ts';

/** How a text travels: `units` are septets (seven-bit) or UTF-16 code units (UCS-2). */
export interface SegmentCount {
  encoding: 'seven-bit' | 'ucs-2';
  units: number;
  segments: number;
  /** Units that still fit into the last segment. */
  unitsLeft: number;
}

/** Units of a text of one segment, and of each segment of a longer one (its header takes six octets). */
const capacities = {
  'seven-bit': { single: 160, joined: 153 },
  'ucs-2': { single: 70, joined: 67 },
} as const;

/**
 * Segments that a text is split into and paid for by (3GPP TS 23.038 and TS 23.040, 9.2.3.24.1).
 * A letter is never torn apart: an extension letter (two septets) or a surrogate pair (two code units) that does not
 * fit moves to the next segment as a whole, so the count may exceed units divided by 153 or 67.
 * @returns one empty segment for an empty text
 */
export function countSegments(text: string): SegmentCount {
  const encoding = isSevenBit(text) ? 'seven-bit' : 'ucs-2';
  const { single, joined } = capacities[encoding];
  const lengths = [...text].map((letter) => septetsFor(letter, encoding));
  const units = lengths.reduce((sum, length) => sum + length, 0);
  if (units <= single) return { encoding, units, segments: 1, unitsLeft: single - units };

  let segments = 1;
  let used = 0;
  for (const length of lengths) {
    if (used + length > joined) {
      segments += 1;
      used = 0;
    }
    used += length;
  }
  return { encoding, units, segments, unitsLeft: joined - used };
}

function septetsFor(letter: string, encoding: SegmentCount['encoding']): number {
  return encoding === 'ucs-2' ? letter.length : (septetsOfLetter(letter) ?? 0);
}
