import { describe, expect, it } from 'vitest';
import { countSeptets, isSevenBit } from './gsm-alphabet.ts';

describe('the seven-bit alphabet (3GPP TS 23.038)', () => {
  it('holds 127 letters and the ten of the extension table, each of which counts two', () => {
    const letters = Array.from({ length: 0x10000 }, (_, code) => String.fromCharCode(code)).filter(
      isSevenBit,
    );
    const ones = letters.filter((letter) => countSeptets(letter) === 1);
    const twos = letters.filter((letter) => countSeptets(letter) === 2);
    // 128 places of the default table less the escape to the extension table.
    expect(ones).toHaveLength(127);
    expect(twos.sort()).toEqual(['\f', '[', '\\', ']', '^', '{', '|', '}', '~', '€'].sort());
  });

  it('knows the letters that languages most often get wrong', () => {
    expect(isSevenBit('ñÑ¿¡üÜéÉàèìòù')).toBe(true);
    for (const letter of 'áíóúÁÍÓÚçąćęłńóśźżđăâêôơư°−–’“\u00a0`')
      expect(isSevenBit(letter), letter).toBe(false);
    expect(isSevenBit('Ç')).toBe(true);
  });

  it('refuses to count a letter that it does not hold', () => {
    expect(() => countSeptets('150 °C')).toThrow(RangeError);
  });
});
