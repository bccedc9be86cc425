import { describe, expect, it } from 'vitest';
import { languages } from '../../i18n/languages.ts';
import { translatorFor } from '../../i18n/translator.ts';
import { countCsvRows, readCsv, withoutFormulaGuard, writeCsv } from './csv.ts';
import { readHeadings, readImport } from './import.ts';
import { importColumns, readDays, readHeading, readLanguage, readRoles } from './import-columns.ts';

const shop = { language: 'en', textNumber: '+12025550100' } as const;
const limit = { rows: 5_000 };

function read(text: string) {
  const [first, ...rows] = readCsv(text, limit);
  const headings = readHeadings(first);
  if (!headings) throw new Error('no headings');
  return readImport(rows, headings, shop);
}

describe('a file of people', () => {
  it.each([
    ['commas', 'name,phone\nAna Ruiz,+1 202 555 0142\n'],
    ['semicolons', 'name;phone\nAna Ruiz;+1 202 555 0142\n'],
    ['tabs', 'name\tphone\nAna Ruiz\t+1 202 555 0142\n'],
    ['a byte order mark', '\uFEFFname;phone\nAna Ruiz;+1 202 555 0142\n'],
    ['CRLF', 'name,phone\r\nAna Ruiz,+1 202 555 0142\r\n'],
    ['lone returns', 'name,phone\rAna Ruiz,+1 202 555 0142\r'],
    ['quotes', '"name","phone"\n"Ana Ruiz","+1 202 555 0142"\n'],
    ['no end of the last line', 'name,phone\nAna Ruiz,2025550142'],
    ['blank lines', 'name,phone\n\n ,\nAna Ruiz,2025550142\n\n'],
    ['Polish headings', 'Imię i nazwisko;Telefon\nAna Ruiz;202-555-0142\n'],
    ['Vietnamese headings', 'Họ tên,Điện thoại\nAna Ruiz,202-555-0142\n'],
    ['the guard against formulas', "name,phone\nAna Ruiz,'+12025550142\n"],
  ])('with %s is read', (_, text) => {
    const { people, faults } = read(text);
    expect(faults).toEqual([]);
    expect(people.map(({ fields }) => [fields.name, fields.phone])).toEqual([['Ana Ruiz', '+12025550142']]);
  });

  it('may hold separators, quotes and line breaks inside quoted cells; lines are counted as an editor does', () => {
    const { people, faults } = read(
      'name,phone\r\n"Ruiz, ""Ana""",2025550142\r\n"Line 3\r\nphone",x\r\nMinh,y\r\n',
    );
    expect(people[0]?.fields.name).toBe('Ruiz, "Ana"');
    expect(faults.map(({ line, code }) => [line, code])).toEqual([
      [3, 'bad-name'],
      [3, 'bad-phone'],
      [5, 'bad-phone'],
    ]);
  });

  it('gives what is left out the usual value', () => {
    expect(read('name\nAna').people[0]?.fields).toEqual({
      kind: 'person',
      name: 'Ana',
      email: null,
      phone: null,
      language: 'en',
      plainLetters: true,
      roles: ['operator'],
      safetyPerson: false,
      workSpans: [{ days: [1, 2, 3, 4, 5], fromMinute: 360, toMinute: 840 }],
    });
  });

  it('may say everything', () => {
    const text =
      'name;mail;language;roles;days;from;to\nDana;Dana@Shop.example;Polski;supervisor/operator;1-3,7;22:00;6:00\n';
    expect(read(text).people[0]?.fields).toMatchObject({
      email: 'dana@shop.example',
      language: 'pl',
      roles: ['supervisor', 'operator'],
      workSpans: [{ days: [1, 2, 3, 7], fromMinute: 1320, toMinute: 360 }],
    });
  });

  it.each([
    [',2025550142', 'no-name'],
    ['Ana,12', 'bad-phone'],
    ['Ana,=cmd()', 'bad-phone'],
    ['Ana,,ana@', 'bad-mail'],
    ['Ana,,,Klingon', 'bad-language'],
    ['Ana,,,,boss', 'bad-role'],
    ['Ana,,,,supervisor', 'mail-needed'],
    ['Line 3,,,,line phone', 'phone-needed'],
    ['Ana,,,,,8', 'bad-days'],
    ['Ana,,,,,5-1', 'bad-days'],
    ['Ana,,,,,,25:00,26:00', 'bad-time'],
    ['Ana,,,,,,06:00', 'half-hours'],
    ['Ana,,,,,,,,more', 'too-many-cells'],
    ['"Ana,2025550142', 'quotes'],
  ])('with the row %s is refused for %s', (row, code) => {
    const { people, faults } = read(`name,phone,mail,language,roles,days,from,to\n${row}`);
    expect(people).toEqual([]);
    expect(faults).toContainEqual(expect.objectContaining({ line: 2, code }));
  });

  it('names every fault of a row and both lines of a repeat', () => {
    const { faults } = read('name,phone,mail\nAna,12,nobody\nMinh,2025550142,\nLee,(202) 555-0142,\n');
    expect(faults).toEqual([
      { line: 2, code: 'bad-phone', text: '12' },
      { line: 2, code: 'bad-mail', text: 'nobody' },
      { line: 4, code: 'same-phone', text: '+12025550142', otherLine: 3 },
    ]);
  });

  it.each(['', 'Ana,+12025550142\nMinh,+12025550155', '\uFEFF\n\n'])(
    'without headings is none: %j',
    (text) => {
      expect(readHeadings(readCsv(text, limit)[0])).toBeNull();
    },
  );

  it('far too long is read no further than needed, and counted whole', () => {
    const text = `name\n${'Ana\n'.repeat(100_000)}`;
    expect(readCsv(text, limit)).toHaveLength(5_001);
    expect(countCsvRows(text)).toBe(100_001);
  });
});

describe('the headings that the page names', () => {
  it.each(languages)('are all read in %s', (language) => {
    const t = translatorFor(language);
    const named = importColumns.map((column) => t(`people:import.heading.${column}`));
    expect(named.map(readHeading)).toEqual([...importColumns]);
  });
});

describe('cells', () => {
  it('become no formula in a spreadsheet, and come back as they were', () => {
    const text = writeCsv([['=1+1', '+12025550142', '-2', '@x', 'plain, "quoted"']]);
    const [row] = readCsv(text, limit);
    expect(row?.cells.slice(0, 4)).toEqual(["'=1+1", "'+12025550142", '-2', "'@x"]);
    expect(row?.cells.map(withoutFormulaGuard)).toEqual([
      '=1+1',
      '+12025550142',
      '-2',
      '@x',
      'plain, "quoted"',
    ]);
  });

  it.each([
    ['1-5', [1, 2, 3, 4, 5]],
    ['1, 2 6-7', [1, 2, 6, 7]],
    ['0', undefined],
    ['', undefined],
  ])('"%s" as days', (cell, days) => {
    expect(readDays(cell)).toEqual(days);
  });

  it('name roles and languages in any of our languages', () => {
    expect(readRoles('Brygadzista, inżynier')).toEqual({ kind: 'person', roles: ['supervisor', 'engineer'] });
    expect(readRoles('Teléfono de línea')).toEqual({ kind: 'line phone', roles: ['operator'] });
    expect(readRoles('operator, boss')).toBeUndefined();
    expect([readLanguage('ES'), readLanguage('tieng viet'), readLanguage('xx')]).toEqual([
      'es',
      'vi',
      undefined,
    ]);
  });
});
