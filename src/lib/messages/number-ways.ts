import type { TypedNumber } from './number-list.ts';

/** A number read in one of the ways its points and commas allow. */
export interface ReadNumber {
  value: number;
  tie: TypedNumber['tie'];
}

const pointMeanings = ['decimal', 'thousands'] as const;
const commaMeanings = ['decimal', 'thousands', 'list', 'pairs'] as const;
type PointMeaning = (typeof pointMeanings)[number];
type CommaMeaning = (typeof commaMeanings)[number];

/** All numbers of a text read in one way. */
export interface NumberWay {
  points: PointMeaning;
  read: ReadNumber[];
  /** A comma parts two numbers where it could as well be a decimal comma: only a known range makes that sure. */
  isBold: boolean;
}

/** A double keeps fifteen figures; a longer number would come out as another one. */
const mostFigures = 15;

/**
 * Every way to read the numbers of one text, points as decimal points first. Within a text each sign means one thing:
 * a comma is a decimal comma, parts thousands, parts numbers, or (`41,5,40,8`) does both by turns.
 */
export function waysToRead(numbers: readonly TypedNumber[]): NumberWay[] {
  const ways = new Map<string, NumberWay>();
  const mayBeDecimal = (['decimal', 'pairs'] as const).some((commas) => readAll(numbers, 'decimal', commas));
  const hasCommas = numbers.some(({ typed }) => typed.includes(','));
  for (const points of pointMeanings) {
    for (const commas of commaMeanings) {
      const read = readAll(numbers, points, commas);
      const key = JSON.stringify(read);
      const isBold = hasCommas && commas === 'list' && mayBeDecimal;
      if (read !== null && !ways.has(key)) ways.set(key, { points, read, isBold });
    }
  }
  return [...ways.values()];
}

function readAll(
  numbers: readonly TypedNumber[],
  points: PointMeaning,
  commas: CommaMeaning,
): ReadNumber[] | null {
  const read: ReadNumber[] = [];
  for (const { typed, tie } of numbers) {
    const parts = splitAtCommas(typed, commas);
    const values = parts?.map((part) => readOne(part, points, commas));
    if (!values?.every((value) => value !== null)) return null;
    for (const [place, value] of values.entries()) {
      read.push({ value, tie: place === values.length - 1 ? tie : null });
    }
  }
  return read;
}

function splitAtCommas(typed: string, commas: CommaMeaning): string[] | null {
  const groups = typed.split(',');
  if (commas === 'list') return groups;
  if (commas !== 'pairs') return [typed];
  if (groups.length < 4 || groups.length % 2 === 1) return null;
  return groups.flatMap((group, place) => (place % 2 === 0 ? [`${group},${groups[place + 1]}`] : []));
}

function readOne(part: string, points: PointMeaning, commas: CommaMeaning): number | null {
  const figures = part.replace(/\D/g, '');
  if (figures.replace(/^0+/, '').length > mostFigures) return null;
  const thousands = `${points === 'thousands' ? '.' : ''}${commas === 'thousands' ? ',' : ''}`;
  const decimals = `${points === 'decimal' ? '.' : ''}${commas === 'decimal' || commas === 'pairs' ? ',' : ''}`;
  const whole = /^-?\d+$/;
  if (whole.test(part)) return tidy(part);
  const shape = new RegExp(
    `^-?(?:\\d+|${thousands ? `[1-9]\\d{0,2}(?:[${thousands}]\\d{3})+` : '\\d+'})${decimals ? `(?:[${decimals}]\\d+)?` : ''}$`,
  );
  if (!shape.test(part)) return null;
  const plain = thousands ? part.replace(new RegExp(`[${thousands}]`, 'g'), '') : part;
  return tidy(plain.replace(',', '.'));
}

function tidy(plain: string): number {
  const value = Number(plain);
  return value === 0 ? 0 : value;
}
