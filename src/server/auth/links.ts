import type { Knex } from 'knex';
import { z } from 'zod';
import { now } from '../clock.ts';
import { moment } from '../db/columns.ts';
import { database } from '../db/connection.ts';
import type { ShopScope } from '../db/scope.ts';
import { AppError } from '../errors.ts';
import { newId } from '../ids.ts';
import { hashToken, newToken } from './token.ts';

const linkPurposes = ['setup', 'invite', 'reset', 'sign-in', 'operator', 'share'] as const;
export type LinkPurpose = (typeof linkPurposes)[number];

const hour = 3_600_000;

/** How long each kind of link lives, in milliseconds. The others end with their trial: their maker says when. */
export const linkLifetimes = { setup: 24 * hour, invite: 7 * 24 * hour, reset: hour } as const;
const lifetimes: Partial<Record<LinkPurpose, number>> = linkLifetimes;

export interface Link {
  id: string;
  shopId: string;
  purpose: LinkPurpose;
  personId: string | null;
  trialId: string | null;
  expiresAt: number;
}

const linkRow = z.object({
  id: z.string(),
  shop_id: z.string(),
  purpose: z.enum(linkPurposes),
  person_id: z.string().nullable(),
  trial_id: z.string().nullable(),
  expires_at: moment,
});

/**
 * Makes a link and gives its token, which is kept nowhere: only its hash is stored.
 * @param link.lifetime milliseconds; needed where the purpose has no lifetime of its own
 */
export async function createLink(
  scope: ShopScope,
  link: { purpose: LinkPurpose; personId?: string; trialId?: string; lifetime?: number },
): Promise<{ id: string; token: string }> {
  const lifetime = link.lifetime ?? lifetimes[link.purpose];
  if (lifetime === undefined) throw new RangeError('createLink: link.lifetime is missing');
  const token = newToken();
  const id = newId();
  await scope.db('links').insert({
    id,
    shop_id: scope.shopId,
    token_hash: hashToken(token),
    purpose: link.purpose,
    person_id: link.personId ?? null,
    trial_id: link.trialId ?? null,
    expires_at: now() + lifetime,
    created_at: now(),
  });
  return { id, token };
}

function isLive(query: Knex.QueryBuilder): void {
  query.whereNull('links.used_at').whereNull('links.revoked_at').where('links.expires_at', '>', now());
}

/**
 * The live link behind a token, for exactly this purpose. Looking at it does not use it up.
 * @throws AppError `gone`, whether it is unknown, used, ended, revoked, for something else, or its person has left
 */
export async function openLink(token: string, purpose: LinkPurpose): Promise<Link> {
  const found: unknown = await database()('links')
    .leftJoin('people', 'people.id', 'links.person_id')
    .where({ 'links.token_hash': hashToken(token), 'links.purpose': purpose })
    .where(isLive)
    .where((query) => query.whereNull('people.id').orWhere('people.active', true))
    .first('links.*');
  if (!found) throw new AppError('gone');
  const row = linkRow.parse(found);
  return {
    id: row.id,
    shopId: row.shop_id,
    purpose: row.purpose,
    personId: row.person_id,
    trialId: row.trial_id,
    expiresAt: row.expires_at,
  };
}

/** The shop that the link opens, with the link as the one who acts. */
export function scopeOfLink(link: Link): ShopScope {
  return { db: database(), shopId: link.shopId, actor: { kind: 'link', id: link.id } };
}

/**
 * Uses a link up, in the transaction of what it is used for. Of two visitors at the same time one wins.
 * @throws AppError `gone`
 */
export async function takeLink(scope: ShopScope, link: Link): Promise<void> {
  const taken = await scope
    .db('links')
    .where({ id: link.id, shop_id: link.shopId })
    .where(isLive)
    .update({ used_at: now() });
  if (taken === 0) throw new AppError('gone');
}

/** Ends the live links of a purpose: a person's, or (without a person) the shop's. */
export async function revokeLinks(
  scope: ShopScope,
  which: { purpose: LinkPurpose; personId?: string },
): Promise<void> {
  const links = scope.db('links').where({ shop_id: scope.shopId, purpose: which.purpose }).where(isLive);
  if (which.personId !== undefined) links.where({ person_id: which.personId });
  await links.update({ revoked_at: now() });
}
