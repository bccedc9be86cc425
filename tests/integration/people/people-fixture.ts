import { type AddPerson, addPersonSchema } from '../../../src/features/people/person.schema.ts';
import { listActivity } from '../../../src/server/db/activity-log.ts';
import type { ShopScope } from '../../../src/server/db/scope.ts';
import { AppError } from '../../../src/server/errors.ts';
import { newId } from '../../../src/server/ids.ts';
import { buildPerson, buildShop } from '../../builders/shop.ts';

export const admin = { reach: 'everybody', seesPhones: true } as const;
export const supervisor = { reach: 'operators', seesPhones: false } as const;

/** A shop with one admin who has joined and who acts. */
export async function buildShopWithAdmin(): Promise<{ scope: ShopScope; adminId: string }> {
  const shop = await buildShop();
  const adminId = await buildPerson(shop, ['admin'], { password_hash: 'x', name: 'Robin Vale' });
  return { scope: { ...shop, actor: { kind: 'person', id: adminId } }, adminId };
}

/** Ana, an operator with a phone, unless told otherwise. */
export function describeAna(fields: Record<string, unknown> = {}): AddPerson {
  return addPersonSchema.parse({
    kind: 'person',
    name: 'Ana Ruiz',
    email: null,
    phone: '+1 202 555 0142',
    language: 'es',
    plainLetters: true,
    roles: ['operator'],
    safetyPerson: false,
    workSpans: [{ days: [1, 2, 3, 4, 5, 6, 7], fromMinute: 0, toMinute: 0 }],
    ...fields,
  });
}

export function newAddress(name: string): string {
  return `${name}-${newId()}@shop.example`;
}

/** The refusal that a piece of work must end in. */
export async function refusalOf(work: Promise<unknown>): Promise<AppError> {
  const thrown = await work.then(
    () => null,
    (error: unknown) => error,
  );
  if (thrown instanceof AppError) return thrown;
  throw new Error(`expected a refusal, got ${String(thrown)}`);
}

export async function kindsAbout(scope: ShopScope, id: string): Promise<string[]> {
  return (await listActivity(scope, { limit: 50, subjectId: id })).map((line) => line.kind);
}

export async function waitingMessages(scope: ShopScope, personId: string): Promise<string[]> {
  const found: unknown[] = await scope
    .db('messages')
    .where({ person_id: personId, state: 'waiting' })
    .pluck('template');
  return found.map(String).sort();
}
