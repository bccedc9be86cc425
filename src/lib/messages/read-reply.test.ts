import { describe, expect, it } from 'vitest';
import { oneStrength, rejectsOnly, threeAndRejects, twoStrengths } from '../../../tests/fixtures/replies.ts';
import { readReply } from './read-reply.ts';
import type { ExpectedItem, Reply, ReplyExpectation } from './reply.ts';

const settings = [
  { name: 'JAW TEMP', value: 160 },
  { name: 'DWELL', value: 0.9 },
  { name: 'PRESS', value: 3 },
  { name: 'FILM', value: 'B' },
];
const strength: ExpectedItem = { key: 'a', kind: 'measured', readings: 1, names: ['Strength', 'N'] };
const burnt: ExpectedItem = { key: 'b', kind: 'rejects', readings: 1, lotSize: 50, names: ['burnt edges'] };
const plausible = { a: [25, 60] } as const;

function expects(items: ExpectedItem[], change: Partial<ReplyExpectation> = {}): ReplyExpectation {
  return { items, openRuns: [{ run: 4, state: 'make' }], settings, plausible, ...change };
}

/** A reply in the short form of the tables. */
function describeReply({ intent, run, values = {}, minutes, actual, words, ask }: Reply): string {
  return [
    intent,
    run === undefined ? '' : `run=${run}`,
    ...Object.entries(values).map(([key, numbers]) => `${key}=${JSON.stringify(numbers)}`),
    minutes === undefined ? '' : `min=${minutes}`,
    actual ? `${actual.name}=${actual.value}` : '',
    words === undefined ? '' : JSON.stringify(words),
    ask ? `?${ask}` : '',
  ]
    .filter((part) => part !== '')
    .join(' ');
}

function rowsOf(table: string): [string, string][] {
  return table
    .split('\n')
    .filter((line) => line.includes(' > '))
    .map((line) => {
      const at = line.lastIndexOf(' > ');
      return [line.slice(0, at).replaceAll('\\n', '\n'), line.slice(at + 3)];
    });
}

const three: ExpectedItem = { ...strength, readings: 3 };
const two: ExpectedItem = { ...strength, readings: 2 };

describe.each([
  ['one strength', oneStrength, expects([strength])],
  ['three strengths and burnt edges', threeAndRejects, expects([three, burnt])],
  ['two strengths', twoStrengths, expects([two], { plausible: {} })],
  ['burnt edges', rejectsOnly, expects([burnt])],
])('a reply to %s', (_, table, expectation) => {
  it.each(rowsOf(table))('%j is %s', (text, meaning) => {
    expect(describeReply(readReply(text, expectation))).toBe(meaning);
  });
});

it('stands on at least two hundred examples', () => {
  const tables = [oneStrength, threeAndRejects, twoStrengths, rejectsOnly];
  expect(tables.flatMap(rowsOf).length).toBeGreaterThan(200);
});

describe('the run a reply belongs to', () => {
  const waiting = [
    { run: 2, state: 'measure' as const },
    { run: 3, state: 'measure' as const },
  ];

  it('is the run to make, whatever waits for its result', () => {
    const openRuns = [...waiting, { run: 4, state: 'make' as const }];
    expect(readReply('41.5', expects([strength], { openRuns }))).toMatchObject({ run: 4 });
  });

  it('is asked where only several waiting runs are open', () => {
    const reply = readReply('41.5', expects([strength], { openRuns: waiting }));
    expect(reply).toEqual({ intent: 'reading', values: { a: [41.5] }, ask: 'whichRun' });
  });

  it('is the one that waits where there is one', () => {
    const openRuns = waiting.slice(0, 1);
    expect(readReply('41.5', expects([strength], { openRuns }))).toMatchObject({ run: 2 });
  });

  it('is the one that is named, open or not', () => {
    expect(readReply('run 9 41.5', expects([strength], { openRuns: waiting }))).toMatchObject({ run: 9 });
  });
});

describe('words that mean two things', () => {
  it('are read by the language of the person', () => {
    expect(readReply('co', expects([strength], { language: 'vi' })).intent).toBe('yes');
    expect(readReply('co', expects([strength], { language: 'pl' })).intent).toBe('unreadable');
  });
});

describe('commas', () => {
  it('count where one way of reading them is plausible', () => {
    const large = expects([strength], { plausible: { a: [1000, 1500] } });
    expect(readReply('1,234', large)).toMatchObject({ values: { a: [1234] } });
    expect(readReply('1.234', large)).toMatchObject({ values: { a: [1234] } });
    const small = expects([strength], { plausible: { a: [1, 2] } });
    expect(readReply('1,234', small)).toMatchObject({ values: { a: [1.234] } });
    expect(readReply('1,234', expects([strength], { plausible: {} }))).toMatchObject({ ask: 'whichNumber' });
  });
});
