import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { isSevenBit } from './gsm-alphabet.ts';
import { toPlainLetters } from './plain-letters.ts';

describe('plain letters', () => {
  it('drops Polish accents', () => {
    expect(toPlainLetters('Zażółć gęślą jaźń', 'pl')).toBe('Zazolc gesla jazn');
    expect(toPlainLetters('ZAŻÓŁĆ GĘŚLĄ JAŹŃ', 'pl')).toBe('ZAZOLC GESLA JAZN');
  });

  it('drops Vietnamese marks, also those the alphabet could send', () => {
    expect(toPlainLetters('Đặt nhiệt độ kẹp và gửi kết quả', 'vi')).toBe('Dat nhiet do kep va gui ket qua');
    expect(toPlainLetters('ưỡng', 'vi')).toBe('uong');
    expect(toPlainLetters('Đặt nhiệt'.normalize('NFD'), 'vi')).toBe('Dat nhiet');
  });

  it('keeps in Spanish what makes another word of it', () => {
    expect(toPlainLetters('¿Está el año más caliente? ¡Sí, pingüino!', 'es')).toBe(
      '¿Esta el año mas caliente? ¡Si, pingüino!',
    );
  });

  it('writes names of other languages plainly too', () => {
    expect(toPlainLetters('Łukasz, Nguyễn, Dvořák, Çelik, Straße, Œuvre', 'en')).toBe(
      'Lukasz, Nguyen, Dvorak, Çelik, Straße, OEuvre',
    );
  });

  it('turns typographic signs into typed ones', () => {
    expect(toPlainLetters('“Don’t” – wait… 150\u00a0°C, −3,5 ± 0,2', 'en')).toBe(
      '"Don\'t" - wait... 150 C, -3,5 +/- 0,2',
    );
    const polish = new Intl.NumberFormat('pl').format(-1_234_567.5);
    expect(polish).toContain('\u00a0');
    expect(toPlainLetters(polish, 'pl')).toBe('-1 234 567,5');
  });

  it('does not change what a number says', () => {
    expect(toPlainLetters('10² mm², 1½ bar, ½ turn, ≤ 3', 'en')).toBe('10^2 mm^2, 1 1/2 bar, 1/2 turn, <= 3');
  });

  it('leaves what has no plain letter, rather than write a wrong one', () => {
    expect(toPlainLetters('温度 160 🙂', 'en')).toBe('温度 160 🙂');
  });

  it('sends every letter of the four languages in seven bits, and changes nothing the second time', () => {
    const letters = 'aáàảãạăắằẳẵặâấầẩẫậeéèẻẽẹêếềểễệiíìỉĩịoóòỏõọôốồổỗộơớờởỡợuúùủũụưứừửữựyýỳỷỹỵđñü¿¡ąćęłńśźż';
    const both = letters + letters.toUpperCase();
    for (const language of ['en', 'es', 'pl', 'vi'] as const) {
      const plain = toPlainLetters(both, language);
      expect(isSevenBit(plain), language).toBe(true);
      expect([...plain]).toHaveLength([...both].length);
    }
    fc.assert(
      fc.property(
        fc.string({ unit: 'grapheme' }),
        fc.constantFrom('en', 'es', 'pl', 'vi'),
        (text, language) => {
          const plain = toPlainLetters(text, language);
          expect(toPlainLetters(plain, language)).toBe(plain);
        },
      ),
      { seed: 20_240_301, numRuns: 300 },
    );
  });
});
