import { now } from '../../server/clock.ts';
import { foldForSearch } from '../../server/db/columns.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { newId } from '../../server/ids.ts';
import { findTaken } from './person.repository.ts';
import type { PersonFields } from './person.schema.ts';
import type { ConsentState } from './person.ts';
import { storeWorkHours } from './work-hours.ts';

/** Rows a statement: few enough for the number of values that a database takes at once. */
const batchSize = 200;

function inBatches<Item>(items: readonly Item[]): Item[][] {
  const batches: Item[][] = [];
  for (let start = 0; start < items.length; start += batchSize) {
    batches.push(items.slice(start, start + batchSize));
  }
  return batches;
}

/** Which of these numbers (in this shop) and addresses (anywhere) are here already. */
export async function findManyTaken(
  scope: ShopScope,
  contacts: { phones: readonly string[]; emails: readonly string[] },
): Promise<{ phones: Set<string>; emails: Set<string> }> {
  const taken = { phones: new Set<string>(), emails: new Set<string>() };
  for (const phones of inBatches(contacts.phones)) {
    for (const phone of (await findTaken(scope, { phones, emails: [] })).phones) taken.phones.add(phone);
  }
  for (const emails of inBatches(contacts.emails)) {
    for (const email of (await findTaken(scope, { phones: [], emails })).emails) taken.emails.add(email);
  }
  return taken;
}

/** Adds all of them, in the transaction at hand. */
export async function insertPeople(
  scope: ShopScope,
  people: readonly (PersonFields & { id: string; consent: ConsentState })[],
): Promise<void> {
  const at = now();
  for (const batch of inBatches(people)) {
    await scope.db('people').insert(
      batch.map((person) => ({
        id: person.id,
        shop_id: scope.shopId,
        kind: person.kind,
        name: person.name,
        name_search: foldForSearch(person.name),
        email: person.email,
        phone: person.phone,
        language: person.language,
        plain_letters: person.plainLetters,
        work_hours: storeWorkHours(person.workSpans),
        safety_person: person.safetyPerson,
        consent: person.consent,
        created_at: at,
        updated_at: at,
      })),
    );
  }
  const roles = people.flatMap((person) =>
    person.roles.map((role) => ({ id: newId(), shop_id: scope.shopId, person_id: person.id, role })),
  );
  for (const batch of inBatches(roles)) await scope.db('person_roles').insert(batch);
}

/** Whether a file with this digest was brought in before. */
export async function wasImported(scope: ShopScope, digest: string): Promise<boolean> {
  const line: unknown = await scope
    .db('activity')
    .where({ shop_id: scope.shopId, kind: 'people.imported', subject_id: digest })
    .first('id');
  return line !== undefined;
}
