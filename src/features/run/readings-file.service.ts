import { createHash } from 'node:crypto';
import { recordActivity } from '../../server/db/activity-log.ts';
import { inTransaction } from '../../server/db/in-transaction.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { AppError } from '../../server/errors.ts';
import { csvRowLimit } from '../../server/limits.ts';
import { readCsv, writeCsv } from '../people/csv.ts';
import { findTrialOf, type TrialReader } from '../trial/trial-reader.service.ts';
import { listReadings } from './readings.repository.ts';
import type { ReadingFileFault, ReadingsPreview } from './readings-file.schema.ts';
import {
  type FileFault,
  type FileRun,
  figureHeading,
  listFigureColumns,
  readColumns,
  readReadings,
} from './readings-file.ts';
import { recordRun } from './record-run.service.ts';
import { listResultItems } from './result-items.ts';
import { listRuns } from './run.repository.ts';
import { isBeingRun, requirePlan } from './run-reader.service.ts';
import { writeFigure } from './run-words.ts';

const shownFaults = 100;
const shownRuns = 5;

interface Reading {
  rows: number;
  fileFault: ReadingFileFault | null;
  runs: FileRun[];
  faults: FileFault[];
}

function decode(bytes: Uint8Array): string | null {
  try {
    const text = new TextDecoder('utf-8', { fatal: true }).decode(bytes);
    // A zero byte is no letter: the file is a workbook.
    return text.includes('\0') ? null : text;
  } catch {
    return null;
  }
}

async function readFile(scope: ShopScope, trialId: string, bytes: Uint8Array): Promise<Reading> {
  const unread = (fileFault: ReadingFileFault): Reading => ({ rows: 0, fileFault, runs: [], faults: [] });
  const text = decode(bytes);
  if (text === null) return unread('not-utf8');
  const [first, ...rows] = readCsv(text, { rows: csvRowLimit + 1 });
  if (!first || rows.length === 0) return unread('empty');
  if (rows.length > csvRowLimit) return unread('too-many-rows');
  const items = listResultItems((await requirePlan(scope, trialId)).brief);
  const columns = readColumns(first, items);
  if (columns === null) return unread('no-headings');
  const read = readReadings(rows, columns, { runs: await listRuns(scope, trialId), items });
  return { ...read, rows: rows.length, fileFault: null };
}

function toPreview(digest: string, reading: Reading, kept: number): ReadingsPreview {
  const { rows, fileFault, runs, faults } = reading;
  return {
    ...{ digest, rows, fileFault, kept, faultCount: faults.length, faults: faults.slice(0, shownFaults) },
    sample: runs.slice(0, shownRuns).map(({ run, figures }) => ({
      run: run.number,
      figures: figures.map(({ value, rejects }) => rejects ?? value ?? 0),
    })),
  };
}

const digestOf = (bytes: Uint8Array) => createHash('sha256').update(bytes).digest('hex');

async function requireRunning(scope: ShopScope, trialId: string): Promise<void> {
  const trial = await findTrialOf(scope, trialId);
  if (!isBeingRun(trial)) throw new AppError('not-now', { detail: `readings in ${trial.state}` });
}

/** What would happen with this file: the runs it fills, or each row that is wrong and why. Changes nothing. */
export async function previewReadings(
  scope: ShopScope,
  trialId: string,
  bytes: Uint8Array,
): Promise<ReadingsPreview> {
  await requireRunning(scope, trialId);
  return toPreview(digestOf(bytes), await readFile(scope, trialId, bytes), 0);
}

/**
 * Keeps every reading of a file, or none: it must be the one that was looked at, and right in every row as things stand.
 * @throws AppError `file-changed` for another file, `not-found`, `not-now` where nothing is being run
 */
export function importReadings(
  scope: ShopScope,
  file: { trialId: string; bytes: Uint8Array; previewed: string | undefined },
  reader: TrialReader,
): Promise<ReadingsPreview> {
  const { trialId, bytes, previewed } = file;
  const digest = digestOf(bytes);
  return inTransaction(scope, async (inner) => {
    await requireRunning(inner, trialId);
    if (digest !== previewed) throw new AppError('file-changed');
    const reading = await readFile(inner, trialId, bytes);
    if (reading.fileFault !== null || reading.faults.length > 0) return toPreview(digest, reading, 0);
    for (const { run, figures } of reading.runs) {
      await recordRun(inner, {
        ...{ runId: run.id, figures, submission: `${digest}:${run.id}`, enteredBy: reader.personId },
        end: 'measured',
        source: 'csv',
      });
    }
    const details = { digest, runs: reading.runs.map(({ run }) => run.number) };
    await recordActivity(inner, { kind: 'reading.imported', subjectId: trialId, trialId, details });
    return toPreview(digest, reading, reading.runs.length);
  });
}

/** All runs of a trial with what they were set to and what they gave, as a file that the import reads back. */
export async function exportReadings(scope: ShopScope, trialId: string): Promise<string> {
  const { brief } = await requirePlan(scope, (await findTrialOf(scope, trialId)).id);
  const runs = await listRuns(scope, trialId);
  const readings = await listReadings(
    scope,
    runs.map(({ id }) => id),
  );
  const columns = listFigureColumns(listResultItems(brief));
  const head = ['run', ...brief.factors.map(({ panelName, name }) => panelName ?? name)];
  const rows = runs.map((run) => {
    const own = readings.filter(({ runId, state }) => runId === run.id && state === 'counts');
    return [
      String(run.number),
      ...(run.actual ?? run.planned).map(writeFigure),
      ...columns.map(({ item, part }) => {
        const figure = own.find((one) => one.result === item.result && one.part === part);
        const read = figure?.rejects ?? figure?.value;
        return read === null || read === undefined ? '' : writeFigure(read);
      }),
      run.end ?? '',
      run.warmUp ? '1' : '',
    ];
  });
  return writeCsv([[...head, ...columns.map(figureHeading), 'end', 'warm-up'], ...rows]);
}
