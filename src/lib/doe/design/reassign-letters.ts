import { letterAt, readWord, writeWord } from './words.ts';

/**
 * The same plan with its columns given to other settings: first as it is listed, then once for each other pair of columns that the two given settings
 * could have. Settings change places in twos, so that as few as possible move.
 */
export function reassignPair(
  k: number,
  generators: readonly string[],
  [first, second]: readonly [number, number],
): string[][] {
  const listed = [...generators];
  const others: string[][] = [];
  for (let column = 0; column < k; column++) {
    for (let next = column + 1; next < k; next++) {
      if (column === first && next === second) continue;
      const places = Array.from({ length: k }, (_, index) => index);
      exchange(places, column, first);
      exchange(places, places.indexOf(next), second);
      others.push(generators.map((generator) => rename(generator, places)));
    }
  }
  return [listed, ...others];
}

function exchange(places: number[], at: number, setting: number): void {
  const from = places.indexOf(setting);
  places[from] = places[at] ?? 0;
  places[at] = setting;
}

/** 'D=-AB' with each letter replaced by that of the setting now in its place. */
function rename(generator: string, places: readonly number[]): string {
  const [made = '', product = ''] = generator.split('=');
  const sign = product.startsWith('-') ? '-' : '';
  return `${renameWord(made, places)}=${sign}${renameWord(product.slice(sign.length), places)}`;
}

function renameWord(text: string, places: readonly number[]): string {
  const word = [...text].reduce(
    (bits, letter) => bits | readWord(letterAt(places[Math.log2(readWord(letter))] ?? 0)),
    0,
  );
  return writeWord(word);
}
