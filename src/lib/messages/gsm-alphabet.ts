/**
 * The seven-bit alphabet of text messages: 3GPP TS 23.038 (formerly GSM 03.38), clause 6.2.1, default alphabet
 * and its extension table. A letter of the extension table travels as an escape and a second letter: two septets.
 */
const basicLetters =
  '@£$¥èéùìòÇ\nØø\rÅåΔ_ΦΓΛΩΠΨΣΘΞÆæßÉ' +
  ' !"#¤%&\'()*+,-./0123456789:;<=>?' +
  '¡ABCDEFGHIJKLMNOPQRSTUVWXYZÄÖÑÜ§' +
  '¿abcdefghijklmnopqrstuvwxyzäöñüà';

const extensionLetters = '\f^{}\\[~]|€';

const septetsOf: ReadonlyMap<string, number> = new Map([
  ...[...basicLetters].map((letter): [string, number] => [letter, 1]),
  ...[...extensionLetters].map((letter): [string, number] => [letter, 2]),
]);

/**
 * Septets of one letter.
 * @param letter one Unicode character
 * @returns 1 or 2, or undefined where the alphabet does not hold it
 */
export function septetsOfLetter(letter: string): number | undefined {
  return septetsOf.get(letter);
}

/** True when every letter belongs to the seven-bit alphabet or its extension table. */
export function isSevenBit(text: string): boolean {
  return [...text].every((letter) => septetsOf.has(letter));
}

/**
 * Length of a seven-bit text.
 * @param text letters of the seven-bit alphabet only
 * @returns septets; letters of the extension table count two
 * @throws RangeError naming the first letter that the alphabet does not hold
 */
export function countSeptets(text: string): number {
  let septets = 0;
  for (const letter of text) {
    const count = septetsOf.get(letter);
    if (count === undefined) {
      throw new RangeError(
        `countSeptets: text holds ${JSON.stringify(letter)}, which is not a seven-bit letter`,
      );
    }
    septets += count;
  }
  return septets;
}
