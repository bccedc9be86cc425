import { plainSigns } from './plain-letter-tables.ts';

const fullWidth: ReadonlyMap<string, string> = new Map(
  [...'0123456789.,:;/+-()=#%?'].map((sign) => [
    String.fromCodePoint((sign.codePointAt(0) ?? 0) + 0xfee0),
    sign,
  ]),
);
const signsWithoutMeaning = /[\ufe0e\ufe0f\u20e3]/gu;
/** A raised figure or a fraction sign must not melt into the number before it. */
const staysAsTyped = /[\u00b2\u00b3\u00bd\u00bc\u00be\u00b1\u2264\u2265\u2248]/u;

/** Full-width figures, typographic dashes and odd spaces as any keyboard has them; nothing else changes. */
export function toTypedSigns(text: string): string {
  return [...text.normalize('NFC').replace(signsWithoutMeaning, '')]
    .map((letter) => {
      if (staysAsTyped.test(letter)) return letter;
      return fullWidth.get(letter) ?? (letter === '\u3002' ? '.' : (plainSigns.get(letter) ?? letter));
    })
    .join('');
}
