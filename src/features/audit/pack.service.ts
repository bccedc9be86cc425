import { now } from '../../server/clock.ts';
import { listActivity } from '../../server/db/activity-log.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { readVerdict } from '../verdict/read-verdict.service.ts';
import { sayFact } from '../verdict/verdict-words.ts';
import { listCheckTables } from './pack/check-tables.ts';
import { writeTrialFileSchema } from './pack/json-schema.ts';
import { listScriptWords, type PackReader, packFiles, writeReadme } from './pack/pack-words.ts';
import { listReadingRows } from './pack/readings-table.ts';
import script from './pack/recompute.R?raw';
import { writeReport } from './pack/report.ts';
import { type CsvCell, writeSafeCsv } from './pack/safe-csv.ts';
import { writeZip, type ZipEntry } from './pack/zip.ts';
import { readTrialFile, writeTrialFile } from './trial-file.service.ts';

const lineColumns = [
  'id',
  'shop_id',
  'seq',
  'at',
  'actor_kind',
  'actor_id',
  'kind',
  'subject_id',
  'trial_id',
  'details',
  'prev_hash',
  'hash',
] as const;

/** Every line of the log about the trial, oldest first, with all that its hash is made of. */
async function listLogRows(scope: ShopScope, trialId: string): Promise<CsvCell[][]> {
  const lines = await listActivity(scope, { trialId, limit: Number.MAX_SAFE_INTEGER });
  const rows = lines.toReversed().map((line) => lineColumns.map((column): CsvCell => line[column]));
  return [[...lineColumns], ...rows];
}

/** The latest verdict as its page says it. */
async function sayVerdict(
  scope: ShopScope,
  trialId: string,
  { t, formats, language }: PackReader,
): Promise<string[]> {
  const view = await readVerdict(scope, { trialId, language }, null);
  if (!view) return [];
  const { verdict, confirmation } = view;
  const said = [
    ...(confirmation?.facts ?? []),
    verdict.headline,
    ...verdict.settings,
    ...verdict.pairs,
    ...verdict.trust,
    ...verdict.cannotTell,
  ];
  return said.map((fact) => sayFact(fact, { view, t, formats }));
}

/** The files of a trial's audit pack. */
export async function listPackEntries(
  scope: ShopScope,
  trialId: string,
  reader: PackReader,
): Promise<ZipEntry[]> {
  const file = await readTrialFile(scope, trialId);
  const tables = {
    [packFiles.readings]: listReadingRows(file),
    ...listCheckTables(file),
    [packFiles.activity]: await listLogRows(scope, trialId),
    [packFiles.words]: listScriptWords(reader.t),
  };
  const texts = {
    'README.txt': `\uFEFF${writeReadme(file, reader, now())}`,
    [packFiles.trial]: writeTrialFile(file),
    [packFiles.schema]: `${JSON.stringify(writeTrialFileSchema(), null, 1)}\n`,
    [packFiles.report]: writeReport(file, await sayVerdict(scope, trialId, reader), reader),
    [packFiles.script]: script,
  };
  return [
    ...Object.entries(texts).map(([name, content]) => ({ name, content })),
    ...Object.entries(tables).map(([name, rows]) => ({ name, content: writeSafeCsv(rows) })),
  ];
}

/** The audit pack as a zip. @throws AppError `not-found`, for another shop's trial too */
export async function makePack(scope: ShopScope, trialId: string, reader: PackReader): Promise<Buffer> {
  return writeZip(await listPackEntries(scope, trialId, reader), now());
}
