import type { Knex } from 'knex';
import { z } from 'zod';
import { isLanguage, type Language } from '../../i18n/languages.ts';
import { database } from '../db/connection.ts';
import type { ShopScope } from '../db/scope.ts';
import { roles, rolesMay } from './permissions.ts';

const personRow = z.object({
  id: z.string(),
  shop_id: z.string(),
  shop_name: z.string(),
  email: z.string(),
  password_hash: z.string().nullable(),
  language: z.custom<Language>(isLanguage),
});

/** Somebody who may sign in: active, with a mail address and a role that signs in. */
export interface SignInPerson {
  personId: string;
  shopId: string;
  shopName: string;
  email: string;
  /** Null until the person has chosen a password. */
  passwordHash: string | null;
  language: Language;
}

const rolesThatSignIn = roles.filter((role) => rolesMay([role], 'own.profile'));

function signInPeople(): Knex.QueryBuilder {
  return database()('people')
    .join('shops', 'shops.id', 'people.shop_id')
    .where({ 'people.active': true })
    .whereNotNull('people.email')
    .whereExists((held: Knex.QueryBuilder) =>
      held
        .from('person_roles')
        .where('person_roles.person_id', database().ref('people.id'))
        .whereIn('person_roles.role', rolesThatSignIn)
        .select('person_roles.id'),
    )
    .select(
      'people.id',
      'people.shop_id',
      'people.email',
      'people.password_hash',
      'people.language',
      'shops.name as shop_name',
    );
}

function toPerson(found: unknown): SignInPerson | null {
  if (!found) return null;
  const row = personRow.parse(found);
  return {
    personId: row.id,
    shopId: row.shop_id,
    shopName: row.shop_name,
    email: row.email,
    passwordHash: row.password_hash,
    language: row.language,
  };
}

/** The person of a mail address (in lower case), over all shops: an address is one person's. */
export async function findByAddress(address: string): Promise<SignInPerson | null> {
  return toPerson(await signInPeople().where({ 'people.email': address }).first());
}

/** A person who is known already, such as by a link or a session. */
export async function findByPerson(known: {
  shopId: string;
  personId: string | null;
}): Promise<SignInPerson | null> {
  if (known.personId === null) return null;
  return toPerson(
    await signInPeople().where({ 'people.shop_id': known.shopId, 'people.id': known.personId }).first(),
  );
}

/** Whether anybody of any shop has this mail address. */
export async function isAddressTaken(db: Knex, address: string): Promise<boolean> {
  return (await db('people').where({ email: address }).first('id')) !== undefined;
}

/** The person's own shop, with the person as the one who acts: after a password or a link has shown who it is. */
export function scopeOfPerson(person: Pick<SignInPerson, 'shopId' | 'personId'>): ShopScope {
  return { db: database(), shopId: person.shopId, actor: { kind: 'person', id: person.personId } };
}
