import type { Knex } from 'knex';
import { z } from 'zod';
import type { ShopScope } from '../db/scope.ts';

const row = z.object({ id: z.string(), text_number: z.string() });

/** A shop as the text service knows it: by its number. */
export interface TextNumberScope {
  scope: ShopScope;
  number: string;
}

function open(db: Knex, found: unknown): TextNumberScope {
  const { id, text_number } = row.parse(found);
  return { scope: { db, shopId: id, actor: { kind: 'service', id: null } }, number: text_number };
}

/** The shop that texts to this number belong to, on whose behalf the text service then acts; null for a stranger's. */
export async function scopeOfTextNumber(db: Knex, number: string): Promise<ShopScope | null> {
  const found = await db('shops').where({ text_number: number }).first('id', 'text_number');
  return found ? open(db, found).scope : null;
}

/** Every shop that has a number. */
export async function listTextNumbers(db: Knex): Promise<TextNumberScope[]> {
  const found: unknown[] = await db('shops')
    .whereNotNull('text_number')
    .orderBy('id')
    .select('id', 'text_number');
  return found.map((one) => open(db, one));
}
