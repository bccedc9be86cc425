import { z } from 'zod';
import { languages } from '../../i18n/languages.ts';
import { flag, jsonColumn, moment } from '../../server/db/columns.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { consentStates, type Person, personKinds, personRoles, sortRoles } from './person.ts';
import { storedWorkHoursSchema } from './work-hours.ts';

const personRow = z.object({
  id: z.string(),
  kind: z.enum(personKinds),
  name: z.string(),
  name_search: z.string(),
  email: z.string().nullable(),
  phone: z.string().nullable(),
  language: z.enum(languages),
  plain_letters: flag,
  password_hash: z.string().nullable(),
  work_hours: jsonColumn(storedWorkHoursSchema),
  consent: z.enum(consentStates),
  consent_at: moment.nullable(),
  consent_wording: z.number().nullable(),
  consent_how: z.string().nullable(),
  asked_by: z.string().nullable(),
  safety_person: flag,
  active: flag,
  erased_at: moment.nullable(),
  revision: z.number(),
  created_at: moment,
});

const roleRow = z.object({ person_id: z.string(), role: z.enum(personRoles) });

function toPerson(row: z.output<typeof personRow>, roles: Person['roles']): Person {
  return {
    id: row.id,
    kind: row.kind,
    name: row.name,
    email: row.email,
    phone: row.phone,
    language: row.language,
    plainLetters: row.plain_letters,
    workSpans: row.work_hours.spans,
    roles,
    safetyPerson: row.safety_person,
    consent: row.consent,
    consentAt: row.consent_at,
    consentWording: row.consent_wording,
    consentHow: row.consent_how,
    askedBy: row.asked_by,
    active: row.active,
    erasedAt: row.erased_at,
    joined: row.password_hash !== null,
    revision: row.revision,
    createdAt: row.created_at,
  };
}

/** Rows of `people` as persons, with the roles that each of them holds. */
export async function completePeople(scope: ShopScope, rows: unknown[]): Promise<Person[]> {
  const parsed = z.array(personRow).parse(rows);
  const roles = z.array(roleRow).parse(
    await scope
      .db('person_roles')
      .where({ shop_id: scope.shopId })
      .whereIn(
        'person_id',
        parsed.map((row) => row.id),
      )
      .select('person_id', 'role'),
  );
  return parsed.map((row) => {
    const held = roles.filter((role) => role.person_id === row.id).map((role) => role.role);
    return toPerson(row, sortRoles(held));
  });
}
