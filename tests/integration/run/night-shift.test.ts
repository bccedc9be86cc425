import { DateTime } from 'luxon';
import { expect, it } from 'vitest';
import { now } from '../../../src/server/clock.ts';
import { database } from '../../../src/server/db/connection.ts';
import { buildPerson } from '../../builders/shop.ts';
import { openCrew, passTime, received } from '../message/crew.ts';
import { phoneOf, reply, runNow, startTrial, work } from './text-fixture.ts';

const minute = 60_000;
const hour = 60 * minute;
const crew = openCrew();

function wallTime(hoursFromNow: number): string {
  return DateTime.fromMillis(now() + hoursFromNow * hour, { zone: 'Europe/Warsaw' }).toFormat('HH:mm');
}

const add = (name: string, area: string) =>
  buildPerson(crew.shop, ['operator'], {
    ...{ name, phone: `+1${area}555${crew.phone.slice(-4)}`, consent: 'agreed' },
  });

it('calls whoever is on call then, and lets the day’s supervisor sleep', async () => {
  const lee = await add('Lee', '507');
  const bo = await add('Bo', '508');
  const shifts = [
    { id: 'day', name: 'Day', from: wallTime(-1), to: wallTime(4), runs: crew.ana },
    { id: 'night', name: 'Night', from: wallTime(4), to: wallTime(-1), runs: bo, calls: lee },
  ];
  const shop = await startTrial(crew, { crew: { shifts } });
  const dana = await phoneOf(shop.dana.personId);
  await reply(shop, '41.5');
  await reply(shop, 'skip');
  await passTime(5 * hour);
  // The run that Ana still had is given up, so that the night has its own.
  await reply(shop, 'skip');
  await passTime(minute);
  await work(crew);
  const before = (await received(crew, dana)).length;
  await reply(shop, 'PROBLEM belt slips', await phoneOf(bo));
  expect((await received(crew, await phoneOf(lee))).at(-1)).toMatch(/Bo wrote: belt slips/);
  expect((await received(crew, dana)).length).toBe(before);
});

it('keeps with each reading who sent it', async () => {
  const ola = await add('Ola', '509');
  const shifts = [{ id: 'day', name: 'Day', runs: crew.ana, measures: ola }];
  const shop = await startTrial(crew, { crew: { shifts } });
  await passTime(10 * minute);
  await reply(shop, 'done');
  await reply(shop, '1: 41.5', await phoneOf(ola));
  await passTime(10 * minute);
  await reply(shop, 'done');
  await reply(shop, '2: 40', crew.phone);
  const readings = await database()('readings').where({ run_id: (await runNow(shop, 1)).id });
  expect(readings.map(({ entered_by, value }) => [entered_by, value])).toEqual([[ola, 41.5]]);
});

it('asks a line phone once a shift who is on, and keeps the initials with the run', async () => {
  await database()('people').where({ id: crew.ana }).update({ kind: 'line phone' });
  const shop = await startTrial(crew);
  const asks = async () => (await received(crew)).filter((body) => body.startsWith('Line 3: who is on'));
  expect(await asks()).toEqual(['Line 3: who is on now? Text your initials, like AK.']);
  const before = (await received(crew)).length;
  await reply(shop, 'A.K.');
  expect((await received(crew)).length).toBe(before);
  const notes = await database()('notes').where({ trial_id: shop.trialId });
  expect(notes).toMatchObject([{ words: 'A.K.', run_id: (await runNow(shop, 1)).id, written_by: crew.ana }]);
  await passTime(10 * minute);
  await reply(shop, '41.5');
  expect((await runNow(shop, 2)).state).toBe('asked');
  expect(await asks()).toHaveLength(1);
});
