import { z } from 'zod';
import { isLanguage, type Language } from '../../i18n/languages.ts';
import { now } from '../clock.ts';
import { moment } from '../db/columns.ts';
import { database } from '../db/connection.ts';
import type { ShopScope } from '../db/scope.ts';
import { newId } from '../ids.ts';
import { rolesMay } from './permissions.ts';
import { hashToken, newToken } from './token.ts';
import { rolesOfPerson, type Viewer } from './viewer.ts';

const day = 86_400_000;
/** Tokens live a year; who still needs one then makes a new one. */
const lifetime = 365 * day;
const shownLetters = 10;

const tokenRow = z.object({
  id: z.string(),
  prefix: z.string(),
  name: z.string(),
  created_at: moment,
  expires_at: moment,
  last_used_at: moment.nullable(),
});

/** A token as its owner sees it in the list: never the token itself. */
export interface ListedToken {
  id: string;
  /** The first letters, to tell tokens apart. */
  prefix: string;
  name: string;
  createdAt: number;
  expiresAt: number;
  lastUsedAt: number | null;
}

/** Makes a token. It is given once, here, and kept as a hash only. */
export async function createApiToken(
  scope: ShopScope,
  token: { personId: string; name: string },
): Promise<{ id: string; token: string; expiresAt: number }> {
  const secret = `trywell_${newToken()}`;
  const id = newId();
  const at = now();
  const expiresAt = at + lifetime;
  await scope.db('api_tokens').insert({
    id,
    shop_id: scope.shopId,
    token_hash: hashToken(secret),
    prefix: secret.slice(0, shownLetters),
    name: token.name,
    person_id: token.personId,
    expires_at: expiresAt,
    created_at: at,
  });
  return { id, token: secret, expiresAt };
}

/** The person's tokens that still open something, the newest first. */
export async function listApiTokens(scope: ShopScope, personId: string): Promise<ListedToken[]> {
  const rows = await scope
    .db('api_tokens')
    .where({ shop_id: scope.shopId, person_id: personId })
    .whereNull('revoked_at')
    .where('expires_at', '>', now())
    .orderBy('id', 'desc');
  return z
    .array(tokenRow)
    .parse(rows)
    .map((row) => ({
      id: row.id,
      prefix: row.prefix,
      name: row.name,
      createdAt: row.created_at,
      expiresAt: row.expires_at,
      lastUsedAt: row.last_used_at,
    }));
}

/** @returns whether the person had such a live token */
export async function revokeApiToken(
  scope: ShopScope,
  token: { personId: string; id: string },
): Promise<boolean> {
  const revoked = await scope
    .db('api_tokens')
    .where({ shop_id: scope.shopId, person_id: token.personId, id: token.id })
    .whereNull('revoked_at')
    .update({ revoked_at: now() });
  return revoked > 0;
}

/** Ends every token of a person, in the transaction of why they end. */
export async function revokeApiTokens(scope: ShopScope, personId: string): Promise<void> {
  await scope
    .db('api_tokens')
    .where({ shop_id: scope.shopId, person_id: personId })
    .whereNull('revoked_at')
    .update({ revoked_at: now() });
}

const holderRow = z.object({
  id: z.string(),
  person_id: z.string(),
  shop_id: z.string(),
  last_used_at: moment.nullable(),
  name: z.string(),
  language: z.custom<Language>(isLanguage),
  theme: z.enum(['auto', 'light', 'dark']),
  shop_name: z.string(),
  time_zone: z.string(),
});

const usedEvery = 60_000;

/** The person whom a live token stands for, while the person is active and may hold tokens; else null. */
export async function viewerOfToken(token: string): Promise<Viewer | null> {
  const found: unknown = await database()('api_tokens')
    .join('people', 'people.id', 'api_tokens.person_id')
    .join('shops', 'shops.id', 'api_tokens.shop_id')
    .where({ 'api_tokens.token_hash': hashToken(token), 'people.active': true })
    .whereNull('api_tokens.revoked_at')
    .where('api_tokens.expires_at', '>', now())
    .first(
      'api_tokens.id',
      'api_tokens.person_id',
      'api_tokens.shop_id',
      'api_tokens.last_used_at',
      'people.name',
      'people.language',
      'people.theme',
      'shops.name as shop_name',
      'shops.time_zone',
    );
  if (!found) return null;
  const row = holderRow.parse(found);
  const roles = await rolesOfPerson(row.shop_id, row.person_id);
  if (!rolesMay(roles, 'token.own')) return null;
  if (now() - (row.last_used_at ?? 0) > usedEvery) {
    await database()('api_tokens').where({ id: row.id }).update({ last_used_at: now() });
  }
  return {
    personId: row.person_id,
    shopId: row.shop_id,
    shopName: row.shop_name,
    timeZone: row.time_zone,
    name: row.name,
    language: row.language,
    theme: row.theme,
    roles,
    sessionHandle: null,
  };
}
