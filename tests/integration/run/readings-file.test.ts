import { describe, expect, it } from 'vitest';
import {
  exportReadings,
  importReadings,
  previewReadings,
} from '../../../src/features/run/readings-file.service.ts';
import { database } from '../../../src/server/db/connection.ts';
import { buildShop } from '../../builders/shop.ts';
import { allFigures, type BoardScene, buildBoard, kindsOf } from './run-fixture.ts';

const bytesOf = (text: string) => new TextEncoder().encode(text);
const heading = 'Run;seal strength 1;seal strength 2;burnt edges';

const preview = (scene: BoardScene, text: string) =>
  previewReadings(scene.shop.scope, scene.trialId, bytesOf(text));

async function load(scene: BoardScene, text: string, previewed?: string) {
  const digest = previewed ?? (await preview(scene, text)).digest;
  const file = { trialId: scene.trialId, bytes: bytesOf(text), previewed: digest };
  return importReadings(scene.shop.scope, file, scene.shop.dana);
}

async function readingsOf({ trialId }: BoardScene): Promise<number> {
  const runs = database()('runs').where({ trial_id: trialId }).select('id');
  return (await database()('readings').whereIn('run_id', runs)).length;
}

describe('readings from a file', () => {
  it('are looked at first, then kept, with decimal commas and in any order', async () => {
    const scene = await buildBoard();
    const text = `${heading}\n2;36,4;36,8;1\n1;35.9;36.1;0\n3;37;;\n`;
    expect(await preview(scene, text)).toMatchObject({ rows: 3, faultCount: 0, kept: 0 });
    expect(await readingsOf(scene)).toBe(0);
    expect(await load(scene, text)).toMatchObject({ kept: 3 });
    expect(await scene.run(1)).toMatchObject({ state: 'done' });
    expect((await scene.run(2)).figures.map(({ value, rejects }) => rejects ?? value)).toEqual([
      36.4, 36.8, 1,
    ]);
    expect((await scene.run(3)).state).toBe('made');
    expect(await kindsOf(scene, 1)).toEqual(['reading.imported']);
  });

  it('are kept all or none: each bad row is named with its line', async () => {
    const scene = await buildBoard();
    await scene.doRun(4, { event: 'record', figures: allFigures(36) });
    const before = await readingsOf(scene);
    const text = [
      heading,
      '1;36;37;1',
      '99;36;37;1',
      '4;36;37;1',
      '1;36;37;1',
      '2;about 36;37;1',
      '3;36;37;1.5',
      '5;36;37;51',
      '6;;;',
    ].join('\n');
    const found = await load(scene, text);
    expect(found.kept).toBe(0);
    expect(found.faults).toEqual([
      { line: 3, code: 'no-run', text: '99' },
      { line: 4, code: 'closed-run', text: '4' },
      { line: 5, code: 'same-run', text: '1' },
      { line: 6, code: 'not-a-number', text: 'about 36' },
      { line: 7, code: 'not-whole', text: '1.5' },
      { line: 8, code: 'off-scale', text: '51' },
      { line: 9, code: 'no-figure', text: '6' },
    ]);
    expect(await readingsOf(scene)).toBe(before);
  });

  it('are refused as a file that names no column, is none, or is not the one that was looked at', async () => {
    const scene = await buildBoard();
    expect(await preview(scene, 'a;b\n1;2\n')).toMatchObject({ fileFault: 'no-headings' });
    expect(await preview(scene, '')).toMatchObject({ fileFault: 'empty' });
    expect(await preview(scene, 'PK\0\u0003')).toMatchObject({ fileFault: 'not-utf8' });
    const other = (await preview(scene, `${heading}\n1;1;1;1`)).digest;
    await expect(load(scene, `${heading}\n1;36;37;1`, other)).rejects.toMatchObject({ code: 'file-changed' });
    const elsewhere = await buildShop();
    const file = { trialId: scene.trialId, bytes: bytesOf(heading), previewed: other };
    await expect(importReadings(elsewhere, file, scene.shop.dana)).rejects.toMatchObject({
      code: 'not-found',
    });
  });
});

describe('readings as a file', () => {
  it('hold every run, read back in, and hold no formula but negative numbers', async () => {
    const scene = await buildBoard();
    await scene.doRun(1, { event: 'record', figures: allFigures(-3.5) });
    const plan = await database()('plans').where({ trial_id: scene.trialId }).first();
    const brief = plan.brief.replaceAll('Supplier A', '=cmd()').replaceAll('Supplier B', '@sum');
    await database()('plans').where({ id: plan.id }).update({ brief });
    await database()('runs')
      .where({ trial_id: scene.trialId })
      .update({ planned: database().raw("replace(planned, 'Supplier A', '=cmd()')") });
    const text = await exportReadings(scene.shop.scope, scene.trialId);
    const [head, first, ...rest] = text.trim().split('\r\n');
    expect(head).toBe('run,JAW TEMP,Dwell,Film,seal strength 1,seal strength 2,burnt edges,end,warm-up');
    expect(first).toMatch(/^1,\d+,[\d.]+,[^,]+,-3\.5,-3\.1,1,measured,$/);
    expect(text).toContain(",'=cmd(),");
    expect(text).not.toMatch(/,[=@]/);
    expect(rest.length).toBe((await scene.board()).runs.length - 1);
    const filled = rest.map((row) => row.replace(/,,,,,$/, ',36,37,1,,')).join('\n');
    expect(await load(scene, `${head}\n${filled}`)).toMatchObject({ faultCount: 0, kept: rest.length });
  });
});
