import { execFile } from 'node:child_process';
import { mkdtempSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { promisify } from 'node:util';
import { beforeAll, describe, expect, it } from 'vitest';
import { writeSafeCsv } from '../../../src/features/audit/pack/safe-csv.ts';
import { listPackEntries, makePack } from '../../../src/features/audit/pack.service.ts';
import { readCsv } from '../../../src/features/people/csv.ts';
import { formatsFor } from '../../../src/i18n/format.ts';
import { type Language, languages } from '../../../src/i18n/languages.ts';
import { translatorFor } from '../../../src/i18n/translator.ts';
import { AppError } from '../../../src/server/errors.ts';
import { buildJudgedTrial, buildStand, type Stand } from './audit-fixture.ts';

const run = promisify(execFile);
const readerOf = (language: Language) => ({
  t: translatorFor(language),
  formats: formatsFor(language, 'UTC'),
  language,
});
const files = [
  'README.txt',
  'activity.csv',
  'limits.csv',
  'points.csv',
  'product.csv',
  'readings.csv',
  'recompute.R',
  'report.html',
  'results.csv',
  'settings.csv',
  'trial.json',
  'trial.schema.json',
  'words.csv',
];

let stand: Stand;
let trialId: string;

async function entriesIn(language: Language): Promise<Map<string, string>> {
  const entries = await listPackEntries(stand.scope, trialId, readerOf(language));
  return new Map(entries.map(({ name, content }) => [name, content]));
}

beforeAll(async () => {
  stand = await buildStand();
  trialId = await buildJudgedTrial(stand);
});

describe('the audit pack', () => {
  it('is a zip that another program unpacks to the same files', async () => {
    const folder = mkdtempSync(join(tmpdir(), 'trywell-pack-'));
    const zip = join(folder, 'pack.zip');
    writeFileSync(zip, await makePack(stand.scope, trialId, readerOf('pl')));
    // R unpacks by itself and checks every checksum.
    const program = `stopifnot(length(unzip(${JSON.stringify(zip)}, exdir = ${JSON.stringify(folder)})) > 0)`;
    await run('Rscript', ['--vanilla', '-e', program]);
    expect(
      readdirSync(folder)
        .filter((name) => name !== 'pack.zip')
        .sort(),
    ).toEqual(files);
    const entries = await entriesIn('pl');
    for (const name of files.filter((file) => file !== 'README.txt')) {
      expect(readFileSync(join(folder, name), 'utf8')).toBe(entries.get(name));
    }
    rmSync(folder, { recursive: true });
  });

  it.each(languages)('tells in %s what each of its files is', async (language) => {
    const entries = await entriesIn(language);
    const readme = entries.get('README.txt') ?? '';
    for (const name of files.slice(1)) expect(readme).toContain(`${name}: `);
    expect(entries.get('report.html')).toContain(`<html lang="${language}">`);
  });

  it('has a report that needs nothing beside it and takes no words for markup', async () => {
    const db = stand.scope.db('trials').where({ id: trialId });
    await db.clone().update({ title: '<script>alert(1)</script> & seals' });
    const report = (await entriesIn('en')).get('report.html') ?? '';
    await db.clone().update({ title: 'Line 3 seals' });
    expect(report).toContain('&lt;script&gt;alert(1)&lt;/script&gt; &amp; seals');
    expect(report).not.toMatch(/<(script|link|img|iframe)|https?:|url\(/i);
    expect(report).toContain('Lack of fit');
    expect(report).toContain('8.1');
  });

  it('names nobody', async () => {
    for (const content of (await entriesIn('en')).values()) expect(content).not.toMatch(/Odila|Quist/);
  });

  it('has every reading with its history and every line of the log with its hashes', async () => {
    const entries = await entriesIn('en');
    const readings = readCsv(entries.get('readings.csv') ?? '', { rows: 1000 });
    const stored = await stand.scope.db('readings').where({ shop_id: stand.scope.shopId });
    expect(readings.length).toBe(stored.length + 1);
    const lines = readCsv(entries.get('activity.csv') ?? '', { rows: 1000 });
    const log = await stand.scope.db('activity').where({ trial_id: trialId }).orderBy('seq');
    expect(lines.slice(1).map(({ cells }) => cells.at(-1))).toEqual(log.map(({ hash }) => hash));
  });

  it('is not there for another shop', async () => {
    const { scope } = await buildStand();
    const refused = await makePack(scope, trialId, readerOf('en')).catch((error: unknown) => error);
    expect(refused instanceof AppError && refused.code).toBe('not-found');
  });
});

describe('a table', () => {
  it('guards words that would be formulas and leaves numbers alone', () => {
    const [row] = readCsv(writeSafeCsv([['=1+1', '@x', '+4', '-3', -3, 0.1, 1e-7, null, true]]), { rows: 9 });
    expect(row?.cells).toEqual(["'=1+1", "'@x", "'+4", "'-3", '-3', '0.1', '1e-7', '', 'true']);
  });
});
