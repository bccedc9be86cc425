import { join } from 'node:path';
import type { Knex } from 'knex';
import type { LinkPurpose } from '../../src/server/auth/links.ts';
import { hashToken, newToken } from '../../src/server/auth/token.ts';
import { openDatabase } from '../../src/server/db/connection.ts';
import { newId } from '../../src/server/ids.ts';

/** The database of an app that runs beside the test, to prepare what the app then finds and to look at what it did. */
export function openAppDatabase(app: { dataDir: string }): Knex {
  return openDatabase({ kind: 'sqlite', file: join(app.dataDir, 'trywell.sqlite') });
}

export async function findPersonOf(db: Knex, email: string): Promise<{ id: string; shopId: string }> {
  const row = await db('people').where({ email }).first('id', 'shop_id');
  return { id: String(row?.id), shopId: String(row?.shop_id) };
}

/** Writes a link as the app would; answers its token. */
export async function plantLink(
  db: Knex,
  link: { purpose: LinkPurpose; shopId: string; personId?: string; columns?: Record<string, unknown> },
): Promise<string> {
  const token = newToken();
  await db('links').insert({
    id: newId(),
    shop_id: link.shopId,
    token_hash: hashToken(token),
    purpose: link.purpose,
    person_id: link.personId ?? null,
    expires_at: Date.now() + 3_600_000,
    created_at: Date.now(),
    ...link.columns,
  });
  return token;
}
