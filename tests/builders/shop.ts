import type { Role } from '../../src/server/auth/permissions.ts';
import { foldForSearch } from '../../src/server/db/columns.ts';
import { database } from '../../src/server/db/connection.ts';
import type { ShopScope } from '../../src/server/db/scope.ts';
import { newId } from '../../src/server/ids.ts';

const builtAt = Date.UTC(2026, 0, 5, 8);
let built = 0;

/** A shop of its own with valid defaults, and a scope for it; in the database of an app beside the test if told. */
export async function buildShop(
  overrides: Record<string, unknown> = {},
  db = database(),
): Promise<ShopScope> {
  built += 1;
  const id = newId();
  await db('shops').insert({
    id,
    name: `Test shop ${built}`,
    time_zone: 'Europe/Warsaw',
    language: 'en',
    currency: 'EUR',
    text_number: `+1202555${String(1000 + built)}`,
    created_at: builtAt,
    updated_at: builtAt,
    ...overrides,
  });
  return { db, shopId: id, actor: { kind: 'command', id: null } };
}

/** A person of that shop with the given roles; answers the id. */
export async function buildPerson(
  scope: ShopScope,
  roles: readonly Role[] = ['supervisor'],
  overrides: Record<string, unknown> = {},
): Promise<string> {
  built += 1;
  const id = newId();
  const name = String(overrides['name'] ?? `Person ${built}`);
  await scope.db('people').insert({
    id,
    shop_id: scope.shopId,
    kind: 'person',
    name,
    name_search: foldForSearch(name),
    email: `person${built}@shop.example`,
    phone: null,
    language: 'en',
    work_hours: JSON.stringify({
      v: 1,
      spans: [{ days: [1, 2, 3, 4, 5, 6, 7], fromMinute: 0, toMinute: 1440 }],
    }),
    created_at: builtAt,
    updated_at: builtAt,
    ...overrides,
  });
  for (const role of roles) {
    await scope.db('person_roles').insert({ id: newId(), shop_id: scope.shopId, person_id: id, role });
  }
  return id;
}
