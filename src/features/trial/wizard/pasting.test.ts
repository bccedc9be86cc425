import { describe, expect, it } from 'vitest';
import { differencesOf } from './describe-difference.ts';
import { readPastedSettings } from './paste-settings.ts';
import { pickFigureColumn } from './read-figure-columns.ts';

describe('settings pasted from a spreadsheet', () => {
  it('are numbers or an A-or-B, below headings or without', () => {
    const rows = ['Jaw temp\t140\t160\t150\tC', 'Film\tSupplier A\tSupplier B\tSupplier B', ''];
    const settings = [
      { kind: 'number', name: 'Jaw temp', low: '140', high: '160', usual: '150', unit: 'C' },
      { kind: 'choice', name: 'Film', low: 'Supplier A', high: 'Supplier B', usual: 'high' },
    ];
    expect(readPastedSettings(rows.join('\r\n'))).toEqual(settings);
    expect(readPastedSettings(['Name\tLow\tHigh\tNow\tUnit', ...rows].join('\n'))).toEqual(settings);
    expect(readPastedSettings('Dwell;0,8;1,0')).toMatchObject([{ kind: 'number', low: '0,8', high: '1,0' }]);
  });

  it('are none where no row has a name and two ends', () => {
    expect(readPastedSettings('just some words\n\tx\ty')).toEqual([]);
  });
});

describe('past numbers in a table', () => {
  it('are the column with the most figures, the last of those alike', () => {
    expect(
      pickFigureColumn([
        ['day', 'N', 'who'],
        ['1', '35,2', 'Ana'],
        ['2', '33.9', ''],
      ]),
    ).toEqual(['35,2', '33.9']);
    expect(pickFigureColumn([['a'], []])).toEqual([]);
  });
});

describe('two answers to one question', () => {
  it('are told apart by what stands differently, without the names of rows', () => {
    const setting = { id: 'a', kind: 'number', name: 'Jaw temp', low: '140' };
    const mine = { settings: [{ ...setting, hard: true }] };
    const theirs = { settings: [{ ...setting, id: 'b', low: '145' }] };
    expect(differencesOf(mine, theirs)).toEqual([
      { kind: 'typed', text: '140' },
      { kind: 'choice', text: 'hard' },
    ]);
    expect(differencesOf(theirs, mine)).toEqual([{ kind: 'typed', text: '145' }]);
    expect(differencesOf({ wish: 'more' }, null)).toEqual([{ kind: 'choice', text: 'more' }]);
    expect(differencesOf({ fate: 'hold' }, {})).toEqual([{ kind: 'choice', text: 'hold' }]);
  });
});
