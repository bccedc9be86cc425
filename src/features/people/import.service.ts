import { createHash } from 'node:crypto';
import { recordActivity } from '../../server/db/activity-log.ts';
import { inTransaction } from '../../server/db/in-transaction.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { AppError } from '../../server/errors.ts';
import { newId } from '../../server/ids.ts';
import { isPhoneSuppressed } from '../message/addressee.repository.ts';
import { findShop } from '../shop/shop.repository.ts';
import { countCsvRows, readCsv } from './csv.ts';
import { findManyTaken, insertPeople, wasImported } from './import.repository.ts';
import { type ImportPreview, importLimits } from './import.schema.ts';
import { type ImportedPerson, type ImportReading, readHeadings, readImport } from './import.ts';
import type { ImportFault } from './import-faults.ts';
import { signsIn } from './person.ts';

const shownFaults = 100;
const shownPeople = 5;

type FileFault = NonNullable<ImportPreview['fileFault']>;
type Reading = { people: ImportedPerson[]; faults: ImportFault[]; rows: number; fileFault: FileFault | null };

/** @returns null for bytes that are not UTF-8 */
function decode(bytes: Uint8Array): string | null {
  try {
    return new TextDecoder('utf-8', { fatal: true }).decode(bytes);
  } catch {
    return null;
  }
}

async function readFile(scope: ShopScope, bytes: Uint8Array): Promise<Reading> {
  const unread = (fileFault: FileFault, rows = 0): Reading => ({ people: [], faults: [], rows, fileFault });
  const text = decode(bytes);
  // A zero byte is no letter: the file is a workbook, or written in sixteen-bit letters.
  if (text === null || text.includes('\0')) return unread('not-utf8');
  const [first, ...rows] = readCsv(text, { rows: importLimits.rows + 1 });
  if (!first) return unread('empty');
  const headings = readHeadings(first);
  if (!headings) return unread('no-headings', rows.length + 1);
  if (rows.length === 0) return unread('empty');
  if (rows.length > importLimits.rows) return unread('too-many-rows', countCsvRows(text) - 1);
  const reading: ImportReading = readImport(rows, headings, await findShop(scope));
  return { ...reading, rows: rows.length, fileFault: null };
}

/** Rows whose number somebody of the shop has, or whose address somebody of the installation has. */
async function findClashes(scope: ShopScope, people: readonly ImportedPerson[]): Promise<ImportFault[]> {
  const present = (values: (string | null)[]) => values.filter((value) => value !== null);
  const taken = await findManyTaken(scope, {
    phones: present(people.map(({ fields }) => fields.phone)),
    emails: present(people.map(({ fields }) => fields.email)),
  });
  return people.flatMap(({ line, fields: { phone, email } }) => {
    const faults: ImportFault[] = [];
    if (phone !== null && taken.phones.has(phone)) faults.push({ line, code: 'phone-here', text: phone });
    if (email !== null && taken.emails.has(email)) faults.push({ line, code: 'mail-here', text: email });
    return faults;
  });
}

function toPreview(digest: string, reading: Reading, clashes: ImportFault[], added: number): ImportPreview {
  const faults = [...reading.faults, ...clashes].sort((a, b) => a.line - b.line);
  return {
    digest,
    rows: reading.rows,
    fileFault: reading.fileFault,
    faultCount: faults.length,
    faults: faults.slice(0, shownFaults),
    sample: reading.people
      .slice(0, shownPeople)
      .map(({ line, fields }) => ({ line, name: fields.name, phone: fields.phone })),
    added,
  };
}

function digestOf(bytes: Uint8Array): string {
  return createHash('sha256').update(bytes).digest('hex');
}

/** What would happen with this file: who would be added, or each row that is wrong and why. Changes nothing. */
export async function previewImport(scope: ShopScope, bytes: Uint8Array): Promise<ImportPreview> {
  const reading = await readFile(scope, bytes);
  return toPreview(digestOf(bytes), reading, await findClashes(scope, reading.people), 0);
}

async function addAll(scope: ShopScope, people: readonly ImportedPerson[], digest: string): Promise<void> {
  const added = [];
  for (const { fields } of people) {
    const { phone } = fields;
    const isSuppressed = phone !== null && (await isPhoneSuppressed(scope, phone));
    added.push({ ...fields, id: newId(), consent: isSuppressed ? 'opted out' : 'unasked' } as const);
  }
  await insertPeople(scope, added);
  // One line for the whole file; who got a role that signs in stands in it by id.
  const signingIn = added
    .filter(({ roles }) => signsIn(roles))
    .map(({ id, roles }) => ({ id, before: [], after: roles }));
  await recordActivity(scope, {
    kind: 'people.imported',
    subjectId: digest,
    details: { count: added.length, signingIn },
  });
}

/**
 * Brings everybody of a file in, or nobody: the file must be the one that was looked at, and right in every row, as things
 * stand now.
 * @throws AppError `file-changed` for another file, `already-there` for one that was brought in before
 */
export async function importPeople(
  scope: ShopScope,
  bytes: Uint8Array,
  previewed: string | undefined,
): Promise<ImportPreview> {
  const digest = digestOf(bytes);
  if (digest !== previewed) throw new AppError('file-changed');
  const reading = await readFile(scope, bytes);
  return inTransaction(scope, async (inner) => {
    if (await wasImported(inner, digest)) throw new AppError('already-there');
    const clashes = await findClashes(inner, reading.people);
    const isRight = reading.fileFault === null && reading.faults.length === 0 && clashes.length === 0;
    if (isRight) await addAll(inner, reading.people, digest);
    return toPreview(digest, reading, clashes, isRight ? reading.people.length : 0);
  });
}
