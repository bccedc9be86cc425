import type { Formats } from '../../i18n/format.ts';
import type { Language } from '../../i18n/languages.ts';
import type { Translate } from '../../i18n/translator.ts';

/** Figures as the audit writes them: exact enough to check, in columns with equal decimals. */
export interface AuditFigures {
  /** About six significant digits. */
  one(value: number): string;
  /** For a column: as many decimals for all as show six digits of the largest. */
  column(values: readonly (number | null)[]): (value: number) => string;
  /** A probability; below a ten-thousandth only that. */
  p(value: number): string;
  /** Ticks of a chart. */
  tick(value: number): string;
  /** Of one decimal mark: what a copied table is written with. */
  decimalMark: '.' | ',';
}

/** What every part of the audit's pages gets. */
export interface AuditWording {
  t: Translate;
  formats: Formats;
  figures: AuditFigures;
}

/** Rounding noise beside a column of ordinary figures. */
const negligible = 1e-9;

function decimalsFor(largest: number, digits: number): number {
  if (!(largest > 0)) return 0;
  return Math.min(8, Math.max(2, digits - 1 - Math.floor(Math.log10(largest))));
}

/** @throws RangeError never: a language without data falls back as browsers do */
export function auditFiguresFor(language: Language): AuditFigures {
  const made = new Map<string, Intl.NumberFormat>();
  const fixed = (decimals: number, least = decimals) => {
    const key = `${least} ${decimals}`;
    const known =
      made.get(key) ??
      new Intl.NumberFormat(language, { minimumFractionDigits: least, maximumFractionDigits: decimals });
    made.set(key, known);
    return known;
  };
  const sign = (text: string) => text.replace(/^-/, '\u2212');
  // A rounded zero has no sign.
  const settle = (value: number, decimals: number) => (Math.abs(value) < 0.5 * 10 ** -decimals ? 0 : value);
  const write = (value: number, decimals: number, least = decimals) => {
    if (!Number.isFinite(value)) return value > 0 ? '\u221e' : '\u2212\u221e';
    return sign(fixed(decimals, least).format(settle(value, decimals)));
  };
  const mark = fixed(1).format(1.5).charAt(1);
  return {
    one: (value) => {
      const size = Math.abs(value);
      return write(value, size > 0 && size < negligible ? 2 : decimalsFor(size, 6), 0);
    },
    column: (values) => {
      const sizes = values.flatMap((value) =>
        value !== null && Number.isFinite(value) ? [Math.abs(value)] : [],
      );
      const decimals = decimalsFor(Math.max(0, ...sizes), 6);
      return (value) => write(value, decimals);
    },
    p: (value) => (value < 1e-4 ? `< ${fixed(4).format(1e-4)}` : fixed(4).format(value)),
    tick: (value) => write(value, 3, 0),
    decimalMark: mark === ',' ? ',' : '.',
  };
}
