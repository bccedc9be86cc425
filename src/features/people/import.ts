import type { Language } from '../../i18n/languages.ts';
import { type CsvRow, withoutFormulaGuard } from './csv.ts';
import {
  type ImportColumn,
  importColumns,
  readDays,
  readHeading,
  readLanguage,
  readRoles,
} from './import-columns.ts';
import type { ImportFault, ImportFaultCode } from './import-faults.ts';
import { type PersonFields, personFaults, personFieldSchemas } from './person.schema.ts';
import { parsePhone } from './phone.ts';
import { parseWallTime, usualWorkSpans } from './work-hours.ts';

export interface ImportedPerson {
  line: number;
  fields: PersonFields;
}

export interface ImportReading {
  people: ImportedPerson[];
  faults: ImportFault[];
}

interface ShopDefaults {
  language: Language;
  textNumber: string | null;
}

const shownLetters = 40;

/**
 * The columns that a first row names.
 * @returns null where no name column is among them: that row is no heading
 */
export function readHeadings(row: CsvRow | undefined): (ImportColumn | undefined)[] | null {
  const headings = row?.cells.map(readHeading) ?? [];
  return headings.includes('name') ? headings : null;
}

function cellsByColumn(
  row: CsvRow,
  headings: readonly (ImportColumn | undefined)[],
): Record<ImportColumn, string> {
  const cells = Object.fromEntries(importColumns.map((column) => [column, ''])) as Record<
    ImportColumn,
    string
  >;
  headings.forEach((column, place) => {
    if (column) cells[column] = withoutFormulaGuard(row.cells[place] ?? '');
  });
  return cells;
}

function readHours(cells: Record<ImportColumn, string>): PersonFields['workSpans'] | ImportFaultCode {
  const [usual] = usualWorkSpans;
  if (!usual) return [];
  const days = cells.days === '' ? usual.days : readDays(cells.days);
  if (!days) return 'bad-days';
  if ((cells.from === '') !== (cells.to === '')) return 'half-hours';
  if (cells.from === '') return [{ ...usual, days }];
  const [fromMinute, toMinute] = [parseWallTime(cells.from), parseWallTime(cells.to)];
  return fromMinute === null || toMinute === null ? 'bad-time' : [{ days, fromMinute, toMinute }];
}

function hoursText(code: ImportFaultCode, cells: Record<ImportColumn, string>): string {
  return code === 'bad-days' ? cells.days : `${cells.from}-${cells.to}`;
}

/** One row as a person, or all that is wrong with it. */
function readRow(
  row: CsvRow,
  headings: readonly (ImportColumn | undefined)[],
  shop: ShopDefaults,
): { fields: PersonFields } | { faults: ImportFault[] } {
  const cells = cellsByColumn(row, headings);
  const faults: ImportFault[] = [];
  const refuse = (code: ImportFaultCode, text: string) =>
    faults.push({ line: row.line, code, text: text.slice(0, shownLetters) });

  if (row.quotesBroken) refuse('quotes', row.cells.join(' '));
  if (row.cells.slice(headings.length).some((cell) => cell !== '')) refuse('too-many-cells', cells.name);
  const name = personFieldSchemas.name.safeParse(cells.name);
  if (!name.success) refuse(cells.name === '' ? 'no-name' : 'bad-name', cells.name);
  const phone = cells.phone === '' ? null : parsePhone(cells.phone, shop.textNumber);
  if (phone === null && cells.phone !== '') refuse('bad-phone', cells.phone);
  const email = personFieldSchemas.email.safeParse(cells.mail);
  if (!email.success) refuse('bad-mail', cells.mail);
  const language = cells.language === '' ? shop.language : readLanguage(cells.language);
  if (!language) refuse('bad-language', cells.language);
  const role = readRoles(cells.roles === '' ? 'operator' : cells.roles);
  if (!role) refuse('bad-role', cells.roles);
  const hours = readHours(cells);
  if (typeof hours === 'string') refuse(hours, hoursText(hours, cells));
  if (
    !name.success ||
    !email.success ||
    !language ||
    !role ||
    typeof hours === 'string' ||
    faults.length > 0
  ) {
    return { faults };
  }

  const fields: PersonFields = {
    ...role,
    name: name.data,
    email: email.data,
    phone,
    language,
    plainLetters: true,
    safetyPerson: false,
    workSpans: hours,
  };
  for (const { code } of personFaults(fields)) {
    refuse(code === 'mail-needed' ? 'mail-needed' : 'phone-needed', fields.name);
  }
  return faults.length > 0 ? { faults } : { fields };
}

/** Rows whose number or address stands on an earlier line too. */
function findRepeats(people: readonly ImportedPerson[]): ImportFault[] {
  const seen = new Map<string, number>();
  return people.flatMap(({ line, fields }) =>
    (['phone', 'email'] as const).flatMap((field): ImportFault[] => {
      const value = fields[field];
      if (value === null) return [];
      const otherLine = seen.get(value);
      if (otherLine === undefined) {
        seen.set(value, line);
        return [];
      }
      return [{ line, code: field === 'phone' ? 'same-phone' : 'same-mail', text: value, otherLine }];
    }),
  );
}

/**
 * Reads the rows under the headings as people.
 * @param shop.textNumber says which country's numbers may stand without their country
 */
export function readImport(
  rows: readonly CsvRow[],
  headings: readonly (ImportColumn | undefined)[],
  shop: ShopDefaults,
): ImportReading {
  const people: ImportedPerson[] = [];
  const faults: ImportFault[] = [];
  for (const row of rows) {
    const read = readRow(row, headings, shop);
    if ('fields' in read) people.push({ line: row.line, fields: read.fields });
    else faults.push(...read.faults);
  }
  return { people, faults: [...faults, ...findRepeats(people)] };
}
