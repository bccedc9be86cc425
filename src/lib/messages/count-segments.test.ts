import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { countSegments } from './count-segments.ts';

describe('counting segments', () => {
  it.each([
    ['', 'seven-bit', 0, 1, 160],
    ['a'.repeat(160), 'seven-bit', 160, 1, 0],
    ['a'.repeat(161), 'seven-bit', 161, 2, 145],
    ['a'.repeat(306), 'seven-bit', 306, 2, 0],
    ['a'.repeat(307), 'seven-bit', 307, 3, 152],
    ['€'.repeat(80), 'seven-bit', 160, 1, 0],
    ['€'.repeat(81), 'seven-bit', 162, 2, 143],
    ['ạ'.repeat(70), 'ucs-2', 70, 1, 0],
    ['ạ'.repeat(71), 'ucs-2', 71, 2, 63],
    ['ạ'.repeat(134), 'ucs-2', 134, 2, 0],
    ['ạ'.repeat(135), 'ucs-2', 135, 3, 66],
  ] as const)('%#', (text, encoding, units, segments, unitsLeft) => {
    expect(countSegments(text)).toEqual({ encoding, units, segments, unitsLeft });
  });

  it('moves an extension letter to the next segment rather than tear it', () => {
    // 152 + 2 does not fit 153, so the last place of the first segment stays empty: 306 septets take three segments.
    const text = `${'a'.repeat(152)}€${'a'.repeat(152)}`;
    expect(countSegments(text)).toMatchObject({ units: 306, segments: 3 });
  });

  it('moves an emoji to the next segment rather than tear it', () => {
    const text = `${'ạ'.repeat(66)}🙂${'ạ'.repeat(66)}`;
    expect(countSegments(text)).toMatchObject({ encoding: 'ucs-2', units: 134, segments: 3 });
  });

  it('never counts fewer segments than units demand, nor more than a letter a segment explains', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'grapheme', maxLength: 500 }), (text) => {
        const { encoding, units, segments } = countSegments(text);
        const [single, joined] = encoding === 'seven-bit' ? [160, 153] : [70, 67];
        if (units <= single) {
          expect(segments).toBe(1);
          return;
        }
        expect(segments).toBeGreaterThanOrEqual(Math.ceil(units / joined));
        expect(segments).toBeLessThanOrEqual(Math.ceil(units / (joined - 1)));
      }),
      { seed: 20_240_301, numRuns: 500 },
    );
  });
});
