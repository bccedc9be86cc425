import type { Knex } from 'knex';
import { now } from '../../server/clock.ts';
import { foldForSearch } from '../../server/db/columns.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { newId } from '../../server/ids.ts';
import type { PersonFields } from './person.schema.ts';
import type { ConsentState, Person, PersonRole } from './person.ts';
import { completePeople } from './person-row.repository.ts';
import { storeWorkHours } from './work-hours.ts';

export async function findPerson(scope: ShopScope, id: string): Promise<Person | null> {
  const rows = await scope.db('people').where({ shop_id: scope.shopId, id });
  const [person] = await completePeople(scope, rows);
  return person ?? null;
}

/** Who of these phones and mail addresses is here already. Mail addresses count over the whole installation. */
export async function findTaken(
  scope: ShopScope,
  contacts: { phones: string[]; emails: string[]; exceptId?: string },
): Promise<{ phones: string[]; emails: string[] }> {
  const phones = scope
    .db('people')
    .where({ shop_id: scope.shopId })
    .whereIn('phone', contacts.phones)
    .pluck('phone');
  const emails = scope.db('people').whereIn('email', contacts.emails).pluck('email');
  if (contacts.exceptId !== undefined) {
    phones.whereNot({ id: contacts.exceptId });
    emails.whereNot({ id: contacts.exceptId });
  }
  return { phones: await phones, emails: await emails };
}

function toColumns(fields: Partial<PersonFields>): Record<string, unknown> {
  const { name, email, phone, workSpans, kind, language } = fields;
  const columns: Record<string, unknown> = {
    kind,
    language,
    email,
    phone,
    plain_letters: fields.plainLetters,
    safety_person: fields.safetyPerson,
    ...(name === undefined ? {} : { name, name_search: foldForSearch(name) }),
    ...(workSpans === undefined ? {} : { work_hours: storeWorkHours(workSpans) }),
  };
  return Object.fromEntries(Object.entries(columns).filter(([, value]) => value !== undefined));
}

/** @returns false when a person with this id is there already */
export async function insertPerson(
  scope: ShopScope,
  person: PersonFields & { id: string; consent: ConsentState },
): Promise<boolean> {
  const at = now();
  const added = await scope
    .db('people')
    .insert({
      ...toColumns(person),
      id: person.id,
      shop_id: scope.shopId,
      consent: person.consent,
      created_at: at,
      updated_at: at,
    })
    .onConflict('id')
    .ignore()
    .returning('id');
  if (added.length === 0) return false;
  await insertRoles(scope, person.id, person.roles);
  return true;
}

async function insertRoles(scope: ShopScope, personId: string, roles: readonly PersonRole[]): Promise<void> {
  const rows = roles.map((role) => ({ id: newId(), shop_id: scope.shopId, person_id: personId, role }));
  await scope.db('person_roles').insert(rows);
}

export async function replaceRoles(
  scope: ShopScope,
  personId: string,
  roles: readonly PersonRole[],
): Promise<void> {
  await scope.db('person_roles').where({ shop_id: scope.shopId, person_id: personId }).delete();
  await insertRoles(scope, personId, roles);
}

/** What must be true of a person, besides the state the reader saw, for a change to happen. */
export type ChangeCondition = (query: Knex.QueryBuilder, scope: ShopScope) => void;

/** Another admin stays who can sign in. Part of the statement itself, so that of two who leave at once one stays. */
export const leavesAnAdmin: ChangeCondition = (query, { db, shopId }) => {
  query.whereExists(
    db('people as other')
      .join('person_roles as held', (on) =>
        on.on('held.shop_id', 'other.shop_id').andOn('held.person_id', 'other.id'),
      )
      .where({ 'other.shop_id': shopId, 'other.active': true, 'held.role': 'admin' })
      .whereNotNull('other.password_hash')
      .whereNot('other.id', db.ref('people.id'))
      .select('other.id'),
  );
};

/** Nobody's open run hangs on this person. */
export const holdsNoOpenRun: ChangeCondition = (query, scope) => {
  query.whereNotExists(openRunsOf(scope).select('runs.id'));
};

function openRunsOf({ db, shopId }: ShopScope): Knex.QueryBuilder {
  return db('runs')
    .where({ 'runs.shop_id': shopId })
    .whereNotIn('runs.state', ['done', 'skipped'])
    .where((held) =>
      held
        .where('runs.person_id', db.ref('people.id'))
        .orWhere((measures: Knex.QueryBuilder) => measures.where('runs.measurer_id', db.ref('people.id'))),
    );
}

/**
 * Changes a person's row if it is still as the reader saw it and the conditions hold.
 * @returns whether it was changed
 */
export async function updatePerson(
  scope: ShopScope,
  which: { id: string; revision: number; active?: boolean },
  change: { fields?: Partial<PersonFields>; columns?: Record<string, unknown>; only?: ChangeCondition[] },
): Promise<boolean> {
  const query = scope
    .db('people')
    .where({ shop_id: scope.shopId, id: which.id, revision: which.revision })
    .whereNull('erased_at');
  if (which.active !== undefined) query.where({ active: which.active });
  for (const condition of change.only ?? []) condition(query, scope);
  const changed = await query.update({
    ...toColumns(change.fields ?? {}),
    ...change.columns,
    revision: scope.db.raw('revision + 1'),
    updated_at: now(),
  });
  return changed > 0;
}
