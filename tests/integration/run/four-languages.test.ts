import { DateTime } from 'luxon';
import { expect, it } from 'vitest';
import { readBoard } from '../../../src/features/run/read-board.service.ts';
import { runEventSchema } from '../../../src/features/run/run-event.schema.ts';
import { carryOutRunEvent } from '../../../src/features/run/run-event.service.ts';
import { trialEventSchema } from '../../../src/features/trial/trial.schema.ts';
import { carryOutEvent } from '../../../src/features/trial/trial-event.service.ts';
import { now } from '../../../src/server/clock.ts';
import { database } from '../../../src/server/db/connection.ts';
import { newId } from '../../../src/server/ids.ts';
import { buildPerson } from '../../builders/shop.ts';
import { openCrew, passTime, received } from '../message/crew.ts';
import {
  countingOf,
  lastText,
  phoneOf,
  type RunningShop,
  reply,
  runNow,
  startTrial,
  statesOf,
  trialNow,
  work,
} from './text-fixture.ts';

const minute = 60_000;
const hour = 60 * minute;
const crew = openCrew({ language: 'es' });

/** Strength, and burnt edges out of 50, both from the lab on the day after. */
const nextDay = {
  measuring: { who: 'other', whoName: 'Lab', when: 'later', partsPerRun: '1' },
  watch: {
    results: [{ id: 'burnt', name: 'burnt', wish: 'less', kind: 'rejects', lotSize: '50', noLimit: true }],
  },
} as const;

function wallTime(hoursFromNow: number): string {
  return DateTime.fromMillis(now() + hoursFromNow * hour, { zone: 'Europe/Warsaw' }).toFormat('HH:mm');
}

async function doRun(shop: RunningShop, place: number, event: Record<string, unknown>): Promise<void> {
  const { id, revision } = await runNow(shop, place);
  const body = runEventSchema.parse({ submission: newId(), revision, ...event });
  await carryOutRunEvent(shop.scope, { runId: id, body }, shop.dana);
  await work(crew);
}

async function doTrial(shop: RunningShop, event: Record<string, unknown>): Promise<void> {
  const body = trialEventSchema.parse(event);
  await carryOutEvent(shop.scope, { trialId: shop.trialId, body }, shop.dana);
  await work(crew);
}

it('runs eleven runs with two results over two shifts and a lab, in four languages, to the usual settings', {
  timeout: 240_000,
}, async () => {
  const tail = crew.phone.slice(-4);
  const add = (name: string, language: string, area: string) =>
    buildPerson(crew.shop, ['operator'], {
      ...{ name, language, phone: `+1${area}555${tail}`, consent: 'agreed' },
    });
  const minh = await add('Minh', 'vi', '405');
  const ola = await add('Ola', 'pl', '406');
  const [minhPhone, olaPhone] = [await phoneOf(minh), await phoneOf(ola)];
  const shifts = [
    { id: 'day', name: 'Day', from: wallTime(-1), to: wallTime(6), runs: crew.ana, measures: ola },
    { id: 'late', name: 'Late', from: wallTime(6), to: wallTime(-1), runs: minh, measures: ola },
  ];
  const shop = await startTrial(crew, {
    ...{ crew: { shifts }, measuring: nextDay.measuring },
    watch: { results: [...nextDay.watch.results] },
  });
  const make = async (word: string, phone: string): Promise<void> => {
    await passTime(10 * minute);
    await reply(shop, word, phone);
  };

  // Day shift, in Spanish: made with a word, once only after a reminder; one is skipped, one follows a new batch.
  expect(await lastText(shop)).toMatch(/^Line 3, corrida 1 de 11\n.*envie HECHO\.$/s);
  await make('hecho', crew.phone);
  await passTime(41 * minute);
  await work(crew);
  expect(await lastText(shop)).toMatch(/corrida 2 en Line 3 sigue abierta/);
  await make('¡Listo!', crew.phone);
  await make('saltar', crew.phone);
  await make('lote nuevo 77-B', crew.phone);
  await make('hecho', crew.phone);
  expect(await statesOf(shop)).toEqual([
    'made',
    'made',
    'skipped',
    'made',
    'asked',
    ...Array(6).fill('waiting'),
  ]);

  // Ana has to leave: Minh takes the run over, and both know.
  await doRun(shop, 5, { event: 'hand over', personId: minh });
  expect(await lastText(shop)).toMatch(/^La corrida 5 .*Minh/);
  await passTime(minute);
  await work(crew);
  expect(await lastText(shop, minhPhone)).toMatch(/^Line 3, luot 5\/11\n.*nhan XONG\.$/s);
  await make('xong', minhPhone);

  // Late shift, in Vietnamese, on a machine that went cold: a warm-up first, which does not count.
  await doTrial(shop, { event: 'add a run', id: newId(), kind: 'warm-up' });
  await passTime(6 * hour);
  await reply(shop, 'saltar', crew.phone);
  await work(crew);
  const board = () => readBoard(shop.scope, shop.trialId, shop.dana);
  const made = (await board()).runs.filter(({ state }) => state === 'made').length;
  expect(made).toBeGreaterThanOrEqual(4);
  for (let round = 0; round < 10; round += 1) {
    await passTime(10 * minute);
    await work(crew);
    const open = (await board()).runs.find(({ state }) => state === 'asked');
    if (!open) break;
    expect(open.person?.name).toBe('Minh');
    await reply(shop, 'xong', minhPhone);
  }
  const states = (await board()).runs.map(({ state }) => state);
  expect(states.filter((state) => state === 'skipped').length).toBeLessThanOrEqual(2);
  expect(states.every((state) => state === 'made' || state === 'skipped')).toBe(true);

  // The lab, in Polish, the next day: two results of each run, one far off and right, one put right.
  await passTime(36 * hour);
  await work(crew);
  const waiting = (await board()).runs.filter(({ state }) => state === 'made');
  expect((await received(crew, olaPhone)).filter((body) => body.includes('czeka na liczby'))).toHaveLength(
    waiting.length,
  );
  const [odd, fixed] = waiting;
  for (const [place, { number, id }] of waiting.entries()) {
    // "36,1" could be two results, 36 and 1 of 50: a lab that knows writes a point, or names both.
    const strength = id === odd?.id ? '4,15' : (36 + place / 10).toFixed(1);
    await reply(shop, `${number}: ${strength}`, olaPhone);
    if (id === odd?.id) {
      expect(await lastText(shop, olaPhone)).toMatch(/^Przebieg \d+: .*4\.15.*OK/);
      await reply(shop, 'tak', olaPhone);
    }
    await reply(shop, `przebieg ${number}: ${place % 4}/50`, olaPhone);
    if (id === fixed?.id) await reply(shop, `popraw ${number} 37,5, 1/50`, olaPhone);
  }
  await passTime(5_000);
  await work(crew);
  expect(await countingOf(odd?.id ?? '')).toEqual([4.15, 0]);
  expect(await countingOf(fixed?.id ?? '')).toEqual([37.5, 1]);
  expect((await trialNow(shop)).state).toBe('readings in');

  // Back to usual, by whoever made the last run; and the supervisor hears in English that all is in.
  expect(await lastText(shop, minhPhone)).toMatch(/JAW TEMP 150, DWELL 0\.8, PRESS 3\.5\. Nhan XONG\.$/);
  expect(await lastText(shop, await phoneOf(shop.dana.personId))).toMatch(/all 12 runs are in/);
  await reply(shop, 'xong', minhPhone);
  expect((await board()).setBack).toBe('done');
  const stretches = await database()('stretches').where({ trial_id: shop.trialId }).orderBy('n');
  expect(stretches.map(({ kind }) => kind)).toContain('new batch');
  const warmUp = (await board()).runs.find((run) => run.warmUp);
  expect(warmUp).toMatchObject({ number: 12, planned: [150, 0.8, 3.5] });
});
