import { setTimeout as wait } from 'node:timers/promises';
import { afterAll, beforeAll, beforeEach, expect, vi } from 'vitest';
import { askForConsent } from '../../../src/features/message/consent.service.ts';
import { type QueuedMessage, queueMessage } from '../../../src/features/message/message.service.ts';
import { database } from '../../../src/server/db/connection.ts';
import { inTransaction } from '../../../src/server/db/in-transaction.ts';
import type { ShopScope } from '../../../src/server/db/scope.ts';
import { buildPerson, buildShop } from '../../builders/shop.ts';
import { moveClock } from '../../setup/own-database.ts';
import { openTextDesk, type TextDesk } from './text-desk.ts';

/** A shop of its own for each test, with one operator, joined to the stand-ins. */
export interface Crew {
  desk: TextDesk;
  shop: ShopScope;
  /** The shop's number. */
  number: string;
  /** The operator's id and phone. */
  ana: string;
  phone: string;
}

let phones = 0;
let ahead = 0;

/** From now to the next morning of a working day: what is asked at night, or across midnight, is tried on purpose and not by chance. */
function untilMorning(): number {
  const morning = new Date(Date.now());
  morning.setUTCHours(7, 0, 0, 0);
  const isGone = () => morning.getTime() < Date.now();
  const isWeekend = () => morning.getUTCDay() === 0 || morning.getUTCDay() === 6;
  while (isGone() || isWeekend()) morning.setUTCDate(morning.getUTCDate() + 1);
  return morning.getTime() - Date.now();
}

/** Opens the text desk for a test file and gives each of its tests a crew of its own. */
export function openCrew(person: Record<string, unknown> = {}): Crew {
  const crew = {} as Crew;
  beforeAll(async () => {
    await passTime(untilMorning());
    crew.desk = await openTextDesk();
  });
  afterAll(() => crew.desk.close());
  beforeEach(async () => {
    crew.shop = await buildShop({ name: 'Harrow Lane Foods' });
    const row = await database()('shops').where({ id: crew.shop.shopId }).first('text_number');
    crew.number = row.text_number;
    phones += 1;
    crew.phone = `+1202555${String(4000 + phones)}`;
    const email = `ana${phones}@shop.example`;
    crew.ana = await buildPerson(crew.shop, ['operator'], { phone: crew.phone, email, ...person });
  });
  return crew;
}

/** Moves the clock on from where the test file has it, and waits until it is read again. */
export async function passTime(milliseconds: number): Promise<void> {
  ahead += milliseconds;
  moveClock(ahead);
  await wait(250);
}

/** Dana asks whether the person may be texted, and the question goes out. */
export async function ask({ desk, shop, ana }: Crew, personId = ana): Promise<void> {
  const dana = await buildPerson(shop, ['supervisor'], { name: 'Dana' });
  await askForConsent(shop, personId, { id: dana, name: 'Dana' });
  await desk.work();
}

/** A text from a phone, told by webhook and read by the worker, with whatever that sets off. */
export async function textIn({ desk, phone, number }: Crew, body: string, from = phone): Promise<void> {
  const { sid } = await desk.textFromPhone({ from, to: number, body });
  await vi.waitFor(async () => {
    expect(await database()('inbox_texts').where({ provider_id: sid })).toHaveLength(1);
  });
  await desk.work();
}

/** What reached a phone from the shop, oldest first; the text service's own answers are left out. */
export async function received({ desk, phone, number }: Crew, at = phone): Promise<string[]> {
  const texts = await desk.texts();
  return texts
    .filter(({ direction, to, from }) => direction === 'outbound-api' && to === at && from === number)
    .map(({ body }) => body);
}

/** Writes a text that nothing has checked yet, as a careless caller might. */
export function queueCheck(
  { shop, ana }: Pick<Crew, 'shop' | 'ana'>,
  dedupe: string,
  change: { urgent?: boolean; personId?: string; notBefore?: number; trialId?: string } = {},
): Promise<QueuedMessage> {
  return inTransaction(shop, (inside) =>
    queueMessage(inside, {
      template: 'textsCheck',
      params: { shop: `Check ${dedupe}` },
      personId: ana,
      dedupe,
      ...change,
    }),
  );
}

/** The stored message of a purpose. */
export async function message({ shop }: Crew, dedupe: string) {
  return database()('messages').where({ shop_id: shop.shopId, dedupe }).first();
}

export async function personNow({ ana }: Crew) {
  return database()('people').where({ id: ana }).first();
}
