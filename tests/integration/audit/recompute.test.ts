import { execFile } from 'node:child_process';
import { mkdirSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { promisify } from 'node:util';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { listPackEntries } from '../../../src/features/audit/pack.service.ts';
import { makeVerdict } from '../../../src/features/verdict/make-verdict.service.ts';
import { formatsFor } from '../../../src/i18n/format.ts';
import { translatorFor } from '../../../src/i18n/translator.ts';
import { buildPublishedTrial, type PublishedRun } from '../../builders/published-trial.ts';
import { buildJudgedTrial, buildStand, type Stand } from './audit-fixture.ts';

// Each file names its source. Among them: pseudo error with and without blocks, middles, a choice, off-target settings, lost
// runs, repeats, whole plots, counts of unequal lots.
const published: PublishedRun[] = [
  { id: 'filtration-2-4' },
  { id: 'filtration-2-4-1-half' },
  { id: 'filtration-2-4-two-blocks', blocks: true },
  { id: 'yield-2-2-centre' },
  { id: 'nist-catapult-2-5-1' },
  { id: 'npk-2-3-six-blocks', blocks: true },
  { id: 'plasma-etch-2-3-missing-runs' },
  { id: 'pilot-plant-2-3-off-target' },
  { id: 'reactor-2-5' },
  { id: 'titanic-adults-2-2' },
  { id: 'leaf-spring-2-5-1-replicated', hard: 'E' },
];
const language = 'en';
const reader = { t: translatorFor(language), formats: formatsFor(language, 'UTC'), language };
const folder = mkdtempSync(join(tmpdir(), 'trywell-recompute-'));
const run = promisify(execFile);
let stand: Stand;

async function unpack(trialId: string, name: string): Promise<string> {
  const place = join(folder, name);
  mkdirSync(place);
  for (const { name: file, content } of await listPackEntries(stand.scope, trialId, reader)) {
    writeFileSync(join(place, file), content);
  }
  return place;
}

/** One start of R for many packs: R takes its time to begin, the script does not. */
async function recompute(places: readonly string[]): Promise<{ code: number; words: string }[]> {
  const inOrder = places.map((place) => JSON.stringify(place)).join(', ');
  const driver = `for (place in c(${inOrder})) { setwd(place); local({ quit <- function(status) stop(structure(class = c("ended", "condition"), list(message = status, call = NULL)));
    code <- 0; sink("out.txt"); tryCatch(sys.source("recompute.R", list2env(list(quit = quit), parent = globalenv())), ended = function(end) code <<- end$message); sink(); writeLines(as.character(code), "code.txt") }) }`;
  await run('Rscript', ['--vanilla', '-e', driver]);
  return places.map((place) => ({
    code: Number(readFileSync(join(place, 'code.txt'), 'utf8')),
    words: readFileSync(join(place, 'out.txt'), 'utf8'),
  }));
}

function alter(place: string, file: string, change: (text: string) => string): void {
  const path = join(place, file);
  const before = readFileSync(path, 'utf8');
  const after = change(before);
  expect(after).not.toBe(before);
  writeFileSync(path, after);
}

beforeAll(async () => {
  stand = await buildStand();
});
afterAll(() => rmSync(folder, { recursive: true }));

describe('recompute.R', () => {
  it('agrees to 1e-8 on every number of published data sets that were run as trials', async () => {
    const places: string[] = [];
    for (const about of published) {
      const id = await buildPublishedTrial(stand.scope, { ...about, ownerId: stand.reader.personId });
      expect(await makeVerdict(stand.scope, id)).toBe(true);
      places.push(await unpack(id, about.id));
    }
    const found = await recompute(places);
    for (const [index, { code, words }] of found.entries()) {
      const { id } = published[index] ?? { id: '' };
      expect({ id, code, words: code === 0 ? '' : words.slice(-2_000) }).toEqual({ id, code: 0, words: '' });
      expect(words).toContain('All numbers agree to 1e-08.');
      const compared = /(\d+) numbers compared; largest relative difference (\S+),/.exec(words);
      expect(Number(compared?.[1])).toBeGreaterThan(75);
      expect(Number(compared?.[2])).toBeLessThan(1e-8);
    }
    expect(found.at(-1)?.words).toMatch(/whole +sd/);
  }, 180_000);

  it('says which number differs when a reading, or a number of the product, was altered', async () => {
    const id = await buildJudgedTrial(stand);
    const [reading, number, gone] = [await unpack(id, 'r'), await unpack(id, 'n'), await unpack(id, 'g')];
    alter(reading, 'readings.csv', (text) =>
      text.replace(/,(3\d\.\d+),,,counts/, (_, value) => `,${Number(value) + 0.001},,,counts`),
    );
    alter(number, 'product.csv', (text) =>
      text.replace(/(0,effect,A,effect,)([\d.]+)/, (_, before, value) => `${before}${Number(value) + 1e-6}`),
    );
    alter(gone, 'product.csv', (text) => text.replace(/0,effect,B,t,.*\r\n/, ''));
    const [one, two, three] = await recompute([reading, number, gone]);
    expect(one?.code).toBe(1);
    expect(one?.words).toMatch(/DIFFERENT: 0 \/ run \/ \d+ \/ residual/);
    expect(two?.code).toBe(1);
    expect(two?.words).toMatch(/DIFFERENT: 0 \/ effect \/ A \/ effect/);
    expect(two?.words).toContain('1 numbers do not agree.');
    expect(three?.code).toBe(1);
    expect(three?.words).toContain('ONLY ON ONE SIDE: 0 / effect / B / t');
    expect(three?.words).toContain('Not recomputed here:');
  }, 120_000);
});
