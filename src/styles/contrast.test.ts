import { readdirSync, readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { contrastRatio, readColorTokens } from './contrast.ts';

const TEXT = 4.5;
const FIGURE = 7;
const EDGE = 3;

/** [what is drawn, what it lies on, least ratio, where] */
const pairs: readonly (readonly [string, string, number, string])[] = [
  ['ink', 'card', FIGURE, 'run numbers and setting values on a tag'],
  ['ink', 'bench', FIGURE, 'run numbers and setting values beside a rack'],
  ['steel', 'card', TEXT, 'help, units, states'],
  ['steel', 'bench', TEXT, 'notes, table headers under the mouse'],
  ['petrol', 'card', TEXT, 'links, secondary buttons'],
  ['petrol', 'bench', TEXT, 'links, quiet buttons'],
  ['petrol', 'petrol-back', TEXT, 'a button under the mouse, the mark of an info callout'],
  ['petrol-hover', 'card', TEXT, 'a link under the mouse'],
  ['petrol-hover', 'bench', TEXT, 'a link under the mouse'],
  ['on-petrol', 'petrol', FIGURE, 'primary button, flag with the new value'],
  ['on-petrol', 'petrol-hover', TEXT, 'primary button under the mouse'],
  ['ink', 'petrol-back', TEXT, 'info callout, menu line under the mouse'],
  ['good', 'card', TEXT, 'done'],
  ['good', 'bench', TEXT, 'saved'],
  ['good', 'good-back', TEXT, 'mark of a good callout'],
  ['ink', 'good-back', TEXT, 'good callout'],
  ['caution', 'card', TEXT, 'a state that waits for somebody'],
  ['caution', 'bench', TEXT, 'a state that waits for somebody'],
  ['caution', 'caution-back', TEXT, 'mark of a caution callout'],
  ['ink', 'caution-back', TEXT, 'caution callout'],
  ['steel', 'caution-back', TEXT, 'second line of a caution'],
  ['stop', 'card', TEXT, 'field error'],
  ['stop', 'bench', TEXT, 'field error'],
  ['stop', 'stop-back', TEXT, 'mark of a stop callout'],
  ['ink', 'stop-back', TEXT, 'stop callout'],
  ['on-stop', 'stop', TEXT, 'stop button'],
  ['on-stop', 'stop-hover', TEXT, 'stop button under the mouse'],
  ['edge', 'card', EDGE, 'fields, tags, marks, unchosen options'],
  ['edge', 'bench', EDGE, 'tags on the bench, empty states'],
  ['bar', 'card', EDGE, 'bar of a change'],
  ['ink', 'bar', EDGE, 'interval over the bar'],
  ['steel', 'card', EDGE, 'pin of today on a track'],
  ['petrol', 'card', EDGE, 'flag of the value to try'],
  ['stop', 'bench', EDGE, 'stop button against the page'],
  ['petrol', 'caution-back', EDGE, 'focus ring and button edge in a callout'],
  ['petrol', 'stop-back', EDGE, 'focus ring and button edge in a callout'],
  ['petrol', 'good-back', EDGE, 'focus ring and button edge in a callout'],
];

/** Separators carry no meaning, the scrim only dims, and the last two are words of CSS. */
const withoutContrast = ['line', 'scrim', 'transparent', 'current'];

const read = (path: string) => readFileSync(new URL(path, import.meta.url), 'utf8');
const tokens = readColorTokens(read('./tokens.css'));

describe('contrastRatio', () => {
  // The two ends of the WCAG 2.2 scale, and the grey on white that is commonly quoted as just failing 4.5.
  it.each([
    ['#ffffff', '#000000', 21],
    ['#ffffff', '#ffffff', 1],
    ['#777777', '#ffffff', 4.478],
  ])('of %s on %s is %f', (one, other, ratio) => {
    expect(contrastRatio(one, other)).toBeCloseTo(ratio, 3);
  });

  it('refuses what is not a color', () => {
    expect(() => contrastRatio('red', '#ffffff')).toThrow(RangeError);
  });
});

describe.each(['light', 'dark'] as const)('tokens, %s', (theme) => {
  it.each(pairs)('%s on %s reaches %f: %s', (front, back, least) => {
    const frontColor = tokens.get(front)?.[theme];
    const backColor = tokens.get(back)?.[theme];
    expect(frontColor, front).toBeDefined();
    expect(backColor, back).toBeDefined();
    expect(contrastRatio(frontColor ?? '', backColor ?? '')).toBeGreaterThanOrEqual(least);
  });
});

describe('the list of pairs', () => {
  const sheets = [
    './base.css',
    './print.css',
    ...readdirSync(new URL('./pieces/', import.meta.url)).map((name) => `./pieces/${name}`),
  ];
  const used = new Set(
    sheets.flatMap((sheet) => Array.from(read(sheet).matchAll(/var\(--color-([a-z-]+)\)/g), (m) => m[1])),
  );
  const measured = new Set([
    ...pairs.map(([front]) => front),
    ...pairs.map(([, back]) => back),
    ...withoutContrast,
  ]);

  it('measures every color that a style sheet uses', () => {
    expect([...used].filter((name) => name === undefined || !measured.has(name))).toEqual([]);
  });

  it('names only colors that exist, and leaves none unmeasured', () => {
    const unmeasured = [...tokens.keys()].filter((name) => !measured.has(name));
    expect(unmeasured).toEqual([]);
    expect(tokens.size).toBe(
      Array.from(read('./tokens.css').matchAll(/^ {2}--color-[a-z-]+: light-dark/gm)).length,
    );
    expect(tokens.has('ink')).toBe(true);
  });
});
