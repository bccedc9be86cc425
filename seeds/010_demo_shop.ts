import type { Knex } from 'knex';
import { hashPassword } from '../src/server/auth/password.ts';
import { now } from '../src/server/clock.ts';
import { foldForSearch } from '../src/server/db/columns.ts';
import { demoSignIns } from '../src/server/demo-sign-ins.ts';
import { newId } from '../src/server/ids.ts';

// Harrow Lane Foods is an invented firm; its people are invented too. Their numbers are from the range that the North
// American numbering plan keeps for fiction (555-0100 to 555-0199).

interface DemoPerson {
  kind: 'person' | 'line phone';
  name: string;
  roles: string[];
  language: string;
  phone: string | null;
  workHours: [fromMinute: number, toMinute: number];
  consent: 'unasked' | 'agreed';
  safetyPerson?: boolean;
}

const day: [number, number] = [6 * 60, 14 * 60];
const late: [number, number] = [14 * 60, 22 * 60];
const night: [number, number] = [22 * 60, 6 * 60];

const crew: DemoPerson[] = [
  {
    kind: 'person',
    name: 'Ana Ruiz',
    roles: ['operator'],
    language: 'es',
    phone: '+12025550142',
    workHours: day,
    consent: 'agreed',
  },
  {
    kind: 'person',
    name: 'Marek Zielony',
    roles: ['operator'],
    language: 'pl',
    phone: '+12025550155',
    workHours: late,
    consent: 'agreed',
  },
  {
    kind: 'person',
    name: 'Minh Trần',
    roles: ['operator'],
    language: 'vi',
    phone: '+12025550168',
    workHours: night,
    consent: 'unasked',
  },
  {
    kind: 'person',
    name: 'Lee Abbott',
    roles: ['supervisor'],
    language: 'en',
    phone: '+12025550171',
    workHours: night,
    consent: 'agreed',
  },
  {
    kind: 'line phone',
    name: 'Line 3 phone',
    roles: ['operator'],
    language: 'en',
    phone: '+12025550184',
    workHours: day,
    consent: 'agreed',
  },
];

const staff: Record<(typeof demoSignIns)[number]['role'], Omit<DemoPerson, 'name' | 'roles'>> = {
  supervisor: { kind: 'person', language: 'en', phone: '+12025550112', workHours: day, consent: 'agreed' },
  engineer: {
    kind: 'person',
    language: 'en',
    phone: null,
    workHours: day,
    consent: 'unasked',
    safetyPerson: true,
  },
  admin: { kind: 'person', language: 'en', phone: null, workHours: day, consent: 'unasked' },
};

async function addPerson(
  knex: Knex,
  shopId: string,
  person: DemoPerson & { email?: string; passwordHash?: string },
): Promise<void> {
  const at = now();
  const id = newId();
  const [from, to] = person.workHours;
  await knex('people').insert({
    id,
    shop_id: shopId,
    kind: person.kind,
    name: person.name,
    name_search: foldForSearch(person.name),
    email: person.email ?? null,
    phone: person.phone,
    language: person.language,
    password_hash: person.passwordHash ?? null,
    work_hours: JSON.stringify({
      v: 1,
      spans: [{ days: [1, 2, 3, 4, 5, 6, 7], fromMinute: from, toMinute: to }],
    }),
    consent: person.consent,
    consent_at: person.consent === 'agreed' ? at : null,
    consent_wording: person.consent === 'agreed' ? 1 : null,
    consent_how: person.consent === 'agreed' ? 'text' : null,
    safety_person: person.safetyPerson ?? false,
    created_at: at,
    updated_at: at,
  });
  for (const role of person.roles) {
    await knex('person_roles').insert({ id: newId(), shop_id: shopId, person_id: id, role });
  }
}

async function addShop(knex: Knex): Promise<string> {
  const at = now();
  const id = newId();
  await knex('shops').insert({
    id,
    name: 'Harrow Lane Foods',
    time_zone: 'America/New_York',
    language: 'en',
    currency: 'USD',
    text_number: '+12025550100',
    created_at: at,
    updated_at: at,
  });
  return id;
}

export async function seed(knex: Knex): Promise<void> {
  if (await knex('shops').first('id')) return;
  const signingIn: (DemoPerson & { email: string; passwordHash: string })[] = [];
  for (const { name, role, email, password } of demoSignIns) {
    signingIn.push({
      ...staff[role],
      name,
      roles: [role],
      email,
      passwordHash: await hashPassword(password),
    });
  }
  await knex.transaction(async (transaction) => {
    const shopId = await addShop(transaction);
    for (const person of [...signingIn, ...crew]) await addPerson(transaction, shopId, person);
  });
}
