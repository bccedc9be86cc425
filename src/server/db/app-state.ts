import type { Knex } from 'knex';

/** What is kept under a key, for what belongs to the whole installation; null when there is nothing yet. */
export async function readAppState(db: Knex, key: string): Promise<string | null> {
  const row = await db('app_state').where({ key }).first('value');
  return row ? String(row.value) : null;
}

export async function writeAppState(db: Knex, key: string, value: string): Promise<void> {
  await db('app_state').insert({ key, value }).onConflict('key').merge();
}

/**
 * Puts a new value in the place of the one that was read.
 * @param change.before what was read, null for nothing
 * @returns false when somebody else changed it in between
 */
export async function replaceAppState(
  db: Knex,
  change: { key: string; before: string | null; after: string },
): Promise<boolean> {
  const { key, before, after } = change;
  if (before !== null) {
    return (await db('app_state').where({ key, value: before }).update({ value: after })) > 0;
  }
  const added = await db('app_state')
    .insert({ key, value: after })
    .onConflict('key')
    .ignore()
    .returning('key');
  return added.length > 0;
}
