import { describe, expect, it } from 'vitest';
import { database } from '../../src/server/db/connection.ts';

const withoutShop = ['app_state', 'rate_limits', 'worker_leases', 'shops'];

interface ForeignKey {
  id: number;
  table: string;
  from: string;
  to: string;
}

/** What keeps a row of this table inside its shop, or what is missing. */
async function findTenancyFaults(table: string): Promise<string[]> {
  const db = database();
  const faults: string[] = [];
  const columns: { name: string; notnull: number }[] = await db.raw(`pragma table_info('${table}')`);
  const shopColumn = columns.find((column) => column.name === 'shop_id');
  if (!shopColumn) return [`${table} has no shop_id`];
  if (!shopColumn.notnull) faults.push(`${table}.shop_id may be null`);

  const parts: ForeignKey[] = await db.raw(`pragma foreign_key_list('${table}')`);
  const keys = [...new Set(parts.map((part) => part.id))].map((id) => parts.filter((part) => part.id === id));
  for (const key of keys) {
    const [first] = key;
    if (!first || first.table === 'shops') continue;
    if (!key.some((part) => part.from === 'shop_id' && part.to === 'shop_id')) {
      faults.push(`${table}.${first.from} can point into another shop`);
    }
  }
  const referenced = new Set(parts.map((part) => part.from));
  for (const { name } of columns) {
    const free = ['provider_id', 'actor_id', 'subject_id'].includes(name) || table === 'activity';
    if (/_id$|^owner_id$|^(asked|chosen|entered)_by$/.test(name) && !referenced.has(name) && !free) {
      faults.push(`${table}.${name} refers to nothing`);
    }
  }
  const indexes: { name: string; unique: number }[] = await db.raw(`pragma index_list('${table}')`);
  const pairs = await Promise.all(
    indexes
      .filter((index) => index.unique)
      .map(async (index) => {
        const members: { name: string }[] = await db.raw(`pragma index_info('${index.name}')`);
        return members.map((member) => member.name).join(',');
      }),
  );
  if (!pairs.includes('shop_id,id')) faults.push(`${table} lacks unique (shop_id, id)`);
  return faults;
}

describe('the schema', () => {
  it('keeps every row inside its shop', async () => {
    const tables: { name: string }[] = await database().raw(
      "select name from sqlite_master where type = 'table' and name not like 'sqlite_%' and name not like 'knex_%'",
    );
    expect(tables.length).toBeGreaterThan(10);
    const owned = tables.map(({ name }) => name).filter((name) => !withoutShop.includes(name));
    const faults = (await Promise.all(owned.map(findTenancyFaults))).flat();
    expect(faults).toEqual([]);
  });

  it('finds a table that could mix shops', async () => {
    const db = database();
    await db.schema.createTable('loose', (table) => {
      table.text('id').primary();
      table.text('shop_id');
      table.text('person_id').references('id').inTable('people');
    });
    try {
      expect(await findTenancyFaults('loose')).toEqual([
        'loose.shop_id may be null',
        'loose.person_id can point into another shop',
        'loose.shop_id refers to nothing',
        'loose lacks unique (shop_id, id)',
      ]);
    } finally {
      await db.schema.dropTable('loose');
    }
  });
});
