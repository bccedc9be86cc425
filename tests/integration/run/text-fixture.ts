import { expect, vi } from 'vitest';
import type { Answers } from '../../../src/features/trial/answers.schema.ts';
import { database } from '../../../src/server/db/connection.ts';
import { askNextRuns } from '../../../src/worker/ask-next-runs.ts';
import { remind } from '../../../src/worker/remind-of-runs.ts';
import { buildPerson } from '../../builders/shop.ts';
import type { Crew } from '../message/crew.ts';
import { runUntilIdle } from '../message/text-desk.ts';
import { act, buildPlanned, choose, noHazard, save, type TrialShop } from '../trial/trial-fixture.ts';

/** A trial that runs, in the shop of a crew that is joined to the stand-ins. */
export interface RunningShop extends TrialShop {
  trialId: string;
  crew: Crew;
}

const number = (id: string, panelName: string, low: string, high: string, usual: string) =>
  ({ id, kind: 'number', name: panelName, panelName, unit: '', low, high, usual }) as const;

/** Three settings by number and no mix ruled out: eleven runs. One strength a run, at once; Ana runs at any hour. */
export const elevenRuns: Answers = {
  ...noHazard,
  measuring: { who: 'operator', when: 'atOnce', partsPerRun: '1' },
  settings: {
    settings: [
      number('temp', 'JAW TEMP', '140', '160', '150'),
      number('dwell', 'DWELL', '0.6', '1', '0.8'),
      number('press', 'PRESS', '3', '4', '3.5'),
    ],
  },
  neverRun: { mixes: [] },
  spare: { runs: '11', hoursOpen: true, moneyOpen: true },
  pace: { next: 'made', remindMinutes: '40' },
};

let danas = 0;

/** Starts a trial in the crew's shop; Dana runs it and is called by text. */
export async function startTrial(crew: Crew, more: Answers = {}): Promise<RunningShop> {
  await database()('people').where({ id: crew.ana }).update({ consent: 'agreed', name: 'Ana' });
  await database()('conversations').where({ person_id: crew.ana }).delete();
  danas += 1;
  const danaPhone = `+1303555${String(1000 + danas)}`;
  const danaId = await buildPerson(crew.shop, ['supervisor'], {
    name: 'Dana',
    phone: danaPhone,
    consent: 'agreed',
    password_hash: 'x',
  });
  const dana = { personId: danaId, roles: ['supervisor'] as const };
  const as = (reader: { personId: string }) => ({
    ...crew.shop,
    actor: { kind: 'person' as const, id: reader.personId },
  });
  const shop: TrialShop = {
    scope: as(dana),
    dana,
    anaId: crew.ana,
    as,
    add: async (roles, overrides = {}) => ({
      personId: await buildPerson(crew.shop, roles, { password_hash: 'x', ...overrides }),
      roles,
    }),
  };
  const allDay = { shifts: [{ id: 'day', name: 'Day', runs: crew.ana, calls: danaId }] };
  const trialId = await buildPlanned(shop, { ...elevenRuns, crew: allDay, ...more });
  await act(shop, trialId, 'start');
  await work(crew);
  return { ...shop, trialId, crew };
}

export { choose, save };

/** Lets the jobs run until none of them finds anything to do. */
export async function work(crew: Crew): Promise<void> {
  for (let round = 0; round < 3; round += 1) {
    await runUntilIdle([{ ...askNextRuns }, { ...remind }]);
    await crew.desk.work();
  }
}

/** A text from a phone, with whatever it sets off. */
export async function reply(shop: RunningShop, body: string, from = shop.crew.phone): Promise<void> {
  const { desk, number: to } = shop.crew;
  const { sid } = await desk.textFromPhone({ from, to, body });
  await vi.waitFor(async () => {
    expect(await database()('inbox_texts').where({ provider_id: sid })).toHaveLength(1);
  });
  await work(shop.crew);
}

/** The runs as they stand, in the order of running. */
export function runsOf({ trialId }: RunningShop) {
  return database()('runs').where({ trial_id: trialId }).orderBy('place');
}

export async function runNow(shop: RunningShop, place: number) {
  const [run] = await database()('runs').where({ trial_id: shop.trialId, place });
  return run;
}

export async function statesOf(shop: RunningShop): Promise<string[]> {
  return (await runsOf(shop)).map(({ state }: { state: string }) => state);
}

/** What counts for a run: values in the order of results and parts. */
export async function countingOf(runId: string): Promise<(number | null)[]> {
  const rows = await database()('readings')
    .where({ run_id: runId, state: 'counts' })
    .orderBy(['result', 'part']);
  return rows.map(({ value, rejects }: { value: number | null; rejects: number | null }) => value ?? rejects);
}

export async function trialNow({ trialId }: RunningShop) {
  return database()('trials').where({ id: trialId }).first();
}

/** The last text that reached a phone from the shop. */
export async function lastText(shop: RunningShop, at = shop.crew.phone): Promise<string> {
  const { desk, number: from } = shop.crew;
  const texts = await desk.texts();
  const own = texts.filter(
    ({ direction, to, from: sender }) => direction === 'outbound-api' && to === at && sender === from,
  );
  return own.at(-1)?.body ?? '';
}

export async function phoneOf(personId: string): Promise<string> {
  return (await database()('people').where({ id: personId }).first('phone')).phone;
}
