import { describe, expect, it } from 'vitest';
import { fc } from '../../../tests/setup/seeded-properties.ts';
import { readReply } from './read-reply.ts';
import type { ExpectedItem, ReplyExpectation } from './reply.ts';
import { replyIntents } from './reply.ts';
import { toTypedSigns } from './typed-signs.ts';

const item = fc.record({
  kind: fc.constantFrom('measured' as const, 'rejects' as const, 'flaws' as const),
  readings: fc.integer({ min: 1, max: 4 }),
});
const expectations: fc.Arbitrary<ReplyExpectation> = fc.record({
  items: fc
    .array(item, { minLength: 0, maxLength: 3 })
    .map((items) => items.map((one, place): ExpectedItem => ({ ...one, key: `r${place}`, lotSize: 50 }))),
  openRuns: fc.uniqueArray(
    fc.record({
      run: fc.integer({ min: 1, max: 20 }),
      state: fc.constantFrom('make' as const, 'measure' as const),
    }),
    { maxLength: 3, selector: ({ run }) => run },
  ),
  settings: fc.array(fc.record({ name: fc.constant('JAW TEMP'), value: fc.integer({ min: 1, max: 200 }) })),
  plausible: fc.constantFrom({}, { r0: [25, 60] as const }),
});

const piece = fc.oneof(
  fc.stringMatching(/^[-+]?\d{1,5}([.,]\d{1,4})?$/),
  fc.stringMatching(/^[\d.,:/ -]{1,8}$/),
  fc.constantFrom(
    ...[
      'run',
      'fix',
      'DONE',
      'skip',
      'later',
      'cant',
      'problem',
      'danger',
      'N',
      'of',
      '\n',
      '👍',
      '４１',
      '½',
      '²',
      'ok',
    ],
    ...['saltar', 'POMIN', 'bỏ qua', 'JAW TEMP', '?', 'no', 'nie', 'khong', 'di', '%', '~', 'e', 'x'],
  ),
  fc.string({ maxLength: 6, unit: 'grapheme' }),
);
const texts = fc.oneof(
  fc.string({ maxLength: 40, unit: 'grapheme' }),
  fc
    .array(fc.tuple(piece, fc.constantFrom(' ', '', ', ', '\n')), { maxLength: 8 })
    .map((pieces) => pieces.flat().join('')),
);

/** The figures of a number, without point, sign and the zeros that say nothing. */
function figuresOf(plain: string): string {
  return plain.replace(/\D/g, '').replace(/^0+|0+$/g, '');
}

/** Every run of figures with points and commas among them, and every part of such a run between its commas. */
function figuresIn(text: string): Set<string> {
  const runs = toTypedSigns(text).match(/\d+(?:[.,]\d+)*/g) ?? [];
  const parts = runs.flatMap((run) => {
    const groups = run.split(',');
    return [run, ...groups, ...groups.map((group, place) => `${group},${groups[place + 1] ?? ''}`)];
  });
  return new Set(parts.map(figuresOf));
}

describe('any text at all', () => {
  it('is read without a fault, and yields no number that does not stand in it', () => {
    fc.assert(
      fc.property(texts, expectations, (text, expects) => {
        const reply = readReply(text, expects);
        expect(replyIntents).toContain(reply.intent);
        const standing = figuresIn(text);
        for (const value of Object.values(reply.values ?? {}).flat()) {
          expect(Number.isFinite(value)).toBe(true);
          expect([...standing], `${value} in ${JSON.stringify(text)}`).toContain(figuresOf(plainly(value)));
        }
        const isNamed = reply.run !== undefined && expects.openRuns.every(({ run }) => run !== reply.run);
        if (isNamed) expect([...standing]).toContain(figuresOf(String(reply.run)));
      }),
      { numRuns: 5000 },
    );
  });

  it('gives every result the numbers it asks for, or none', () => {
    fc.assert(
      fc.property(texts, expectations, (text, expects) => {
        const { values } = readReply(text, expects);
        for (const [key, numbers] of Object.entries(values ?? {})) {
          const asked = expects.items.find((one) => one.key === key);
          const counts = asked?.kind === 'rejects' ? [1, 2] : [asked?.readings];
          expect(counts).toContain(numbers.length);
        }
      }),
      { numRuns: 2000 },
    );
  });
});

function plainly(value: number): string {
  return value.toLocaleString('en', {
    useGrouping: false,
    maximumFractionDigits: 20,
    maximumSignificantDigits: 17,
  });
}

describe('one number that is asked for', () => {
  const strength: ExpectedItem = { key: 'a', kind: 'measured', readings: 1 };
  const base: ReplyExpectation = { items: [strength], openRuns: [{ run: 4, state: 'make' }], settings: [] };
  const decimals = fc.tuple(fc.integer({ min: 0, max: 99_999 }), fc.integer({ min: 0, max: 99 }));

  it('keeps its value with a point or a comma, whatever harmless stands around it', () => {
    const before = fc.constantFrom('', ' ', 'run 4 ', '4: ', 'it is ', 'son ', 'wynik ', 'ket qua ');
    const behind = fc.constantFrom('', ' N', 'N', '!', '.', ' thanks', ' gracias', ' 👍');
    fc.assert(
      fc.property(before, decimals, fc.constantFrom('.', ','), behind, (start, [whole, part], sign, end) => {
        const fraction = String(part).padStart(2, '0');
        const reply = readReply(`${start}${whole}${sign}${fraction}${end}`, base);
        expect(reply).toEqual({ intent: 'reading', run: 4, values: { a: [Number(`${whole}.${fraction}`)] } });
      }),
    );
  });

  it('is asked back where it equals a setting', () => {
    fc.assert(
      fc.property(decimals, ([whole, part]) => {
        const value = Number(`${whole}.${part}`);
        const reply = readReply(String(value), { ...base, settings: [{ name: 'JAW TEMP', value }] });
        const isDecimal = !/^\d{1,3}\.\d{3}$/.test(String(value));
        if (isDecimal) expect(reply.ask).toBe('sameAsSetting');
      }),
    );
  });

  it('is asked back where a comma may part thousands', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 999 }), fc.integer({ min: 100, max: 999 }), (whole, group) => {
        expect(readReply(`${whole},${group}`, base)).toEqual({
          intent: 'reading',
          run: 4,
          ask: 'whichNumber',
        });
      }),
    );
  });
});
