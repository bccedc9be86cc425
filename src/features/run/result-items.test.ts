import { describe, expect, it } from 'vitest';
import { buildBrief } from '../../../tests/builders/brief.ts';
import { completeFigure, faultOfFigure, listResultItems, missingParts } from './result-items.ts';

const brief = buildBrief(2, {
  response: { name: 'strength', unit: 'N', kind: 'measured', goal: 'more', worthHaving: 3, partsPerRun: 3 },
  watch: [
    { name: 'burnt edges', unit: '', kind: 'rejects', goal: 'less', lotSize: 50 },
    { name: 'bubbles', unit: '', kind: 'flaws', goal: 'less', lotSize: 10 },
  ],
});
const items = listResultItems(brief);
const figure = (result: number, part: number, more = {}) => ({
  result,
  part,
  value: null,
  rejects: null,
  lot: null,
  ...more,
});

describe('the results of a run', () => {
  it('are the main one with its parts, then those that are watched', () => {
    expect(items.map(({ name, parts, lot }) => [name, parts, lot])).toEqual([
      ['strength', 3, null],
      ['burnt edges', 1, 50],
      ['bubbles', 1, 10],
    ]);
  });

  it('are missing as long as a part is', () => {
    const all = [1, 2, 3].map((part) => figure(0, part, { value: 40 }));
    const counts = [figure(1, 1, { rejects: 0, lot: 50 }), figure(2, 1, { value: 2, lot: 10 })];
    expect(missingParts(items, all.slice(1))).toEqual([
      { result: 0, missing: 1 },
      { result: 1, missing: 1 },
      { result: 2, missing: 1 },
    ]);
    expect(missingParts(items, [...all, ...counts])).toEqual([]);
  });

  it('refuse what cannot be a figure of theirs', () => {
    expect(faultOfFigure(items, figure(0, 4, { value: 1 }))).toBe('not-a-choice');
    expect(faultOfFigure(items, figure(3, 1, { value: 1 }))).toBe('not-a-choice');
    expect(faultOfFigure(items, figure(0, 1, { rejects: 1 }))).toBe('missing');
    expect(faultOfFigure(items, figure(1, 1, { rejects: 51 }))).toBe('off-scale');
    expect(faultOfFigure(items, figure(1, 1, { rejects: 1.5 }))).toBe('not-whole');
    expect(faultOfFigure(items, figure(1, 1, { rejects: 51, lot: 60 }))).toBeNull();
    expect(faultOfFigure(items, figure(2, 1, { value: 3, lot: 0 }))).toBe('not-above-zero');
    expect(faultOfFigure(items, figure(0, 1, { value: -2.5 }))).toBeNull();
  });

  it('keep a count with its lot', () => {
    expect(completeFigure(items, figure(1, 1, { rejects: 2 }))).toMatchObject({ rejects: 2, lot: 50 });
    expect(completeFigure(items, figure(0, 1, { value: 2, lot: 50 }))).toMatchObject({ value: 2, lot: null });
  });
});
