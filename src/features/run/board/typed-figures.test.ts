import { describe, expect, it } from 'vitest';
import type { ResultItem } from '../result-items.ts';
import { listFigureFields, readPastedCells, readTypedFigures, typedFigures } from './typed-figures.ts';

const item = (result: number, kind: ResultItem['kind'], parts = 1): ResultItem => ({
  result,
  kind,
  parts,
  name: 'x',
  unit: '',
  lot: null,
  step: null,
});
const fields = listFigureFields([item(0, 'measured', 2), item(1, 'rejects'), item(2, 'flaws')]);

describe('typed readings', () => {
  it('are read by result and part, with a comma or a point', () => {
    expect(fields.map(({ key }) => key)).toEqual(['0-1', '0-2', '1-1', '2-1']);
    expect(readTypedFigures(fields, { '0-1': ' 41,5 ', '0-2': '', '1-1': '3', '2-1': '0' })).toEqual({
      figures: [
        { result: 0, part: 1, value: 41.5 },
        { result: 1, part: 1, rejects: 3 },
        { result: 2, part: 1, value: 0 },
      ],
      faults: {},
    });
  });

  it('name what is no figure, and leave out what did not change', () => {
    const before = typedFigures({
      figures: [{ result: 0, part: 1, value: 40, rejects: null, lot: null, isAskedBack: false }],
    });
    const read = readTypedFigures(fields, { '0-1': '40', '0-2': '4o', '1-1': '-1', '2-1': '1.5' }, before);
    expect(read).toEqual({
      figures: [],
      faults: { '0-2': 'not-a-number', '1-1': 'not-whole', '2-1': 'not-whole' },
    });
  });

  it('come out of a spreadsheet by rows and columns', () => {
    expect(readPastedCells('1\t2\r\n3\t4\r\n')).toEqual([
      ['1', '2'],
      ['3', '4'],
    ]);
    expect(readPastedCells('41,5')).toBeNull();
  });
});
