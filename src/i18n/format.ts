import type { Language } from './languages.ts';

/** Numbers, dates and lists as the reader writes them. */
export interface Formats {
  /** Up to `digits` decimals (3 unless told). */
  number(value: number, digits?: number): string;
  /** Money from integer minor units. */
  money(minorUnits: number, currency: string): string;
  date(moment: number): string;
  time(moment: number): string;
  dateTime(moment: number): string;
  list(items: string[]): string;
  /** Money in whole main units, for what is only about right. */
  roughMoney(amount: number, currency: string): string;
}

/** @param timeZone the shop's IANA zone: every wall time on a page is the shop's, wherever the reader sits */
export function formatsFor(language: Language, timeZone: string): Formats {
  const dateOptions = { day: 'numeric', month: 'short', year: 'numeric' } as const;
  const timeOptions = { hour: '2-digit', minute: '2-digit', hourCycle: 'h23' } as const;
  // A page writes hundreds of numbers, and to make a formatter takes far longer than to use it.
  const byDigits = new Map<number, Intl.NumberFormat>();
  const withDigits = (digits: number) => {
    const known = byDigits.get(digits) ?? new Intl.NumberFormat(language, { maximumFractionDigits: digits });
    byDigits.set(digits, known);
    return known;
  };
  return {
    number: (value, digits = 3) => withDigits(digits).format(value),
    money(minorUnits, currency) {
      const format = new Intl.NumberFormat(language, { style: 'currency', currency });
      return format.format(minorUnits / 10 ** (format.resolvedOptions().maximumFractionDigits ?? 2));
    },
    date: (moment) => new Intl.DateTimeFormat(language, { ...dateOptions, timeZone }).format(moment),
    time: (moment) => new Intl.DateTimeFormat(language, { ...timeOptions, timeZone }).format(moment),
    dateTime: (moment) =>
      new Intl.DateTimeFormat(language, { ...dateOptions, ...timeOptions, timeZone }).format(moment),
    list: (items) => new Intl.ListFormat(language, { type: 'conjunction' }).format(items),
    roughMoney: (amount, currency) =>
      new Intl.NumberFormat(language, { style: 'currency', currency, maximumFractionDigits: 0 }).format(
        amount,
      ),
  };
}

/** A number as people type it, with a decimal point or comma; `null` when it is not one plain number. */
export function parseTypedNumber(text: string): number | null {
  const typed = text.trim().replace('\u2212', '-');
  if (!/^[-+]?\d+([.,]\d+)?$|^[-+]?[.,]\d+$/.test(typed)) return null;
  return Number(typed.replace(',', '.'));
}
