import type { Knex } from 'knex';
import type { Adapter, DatabaseSession, DatabaseUser } from 'lucia';
import { z } from 'zod';
import { isLanguage, type Language } from '../../i18n/languages.ts';
import { clockOffset, now } from '../clock.ts';
import { moment } from '../db/columns.ts';
import { newId } from '../ids.ts';
import { hashToken } from './token.ts';

/** What a session row says besides its id, its person and its end. */
export interface SessionAttributes {
  shopId: string;
  /** Names the session in lists, so that it can be ended without knowing its id. */
  handle: string;
  device: string;
  lastSeenAt: number;
}

export interface PersonAttributes {
  shopId: string;
  shopName: string;
  timeZone: string;
  name: string;
  language: Language;
  theme: 'auto' | 'light' | 'dark';
}

declare module 'lucia' {
  interface Register {
    DatabaseUserAttributes: PersonAttributes;
    DatabaseSessionAttributes: SessionAttributes;
  }
}

const sessionRow = z.object({
  shop_id: z.string(),
  handle: z.string(),
  person_id: z.string(),
  expires_at: moment,
  device: z.string(),
  last_seen_at: moment,
});

const sessionWithPersonRow = sessionRow.extend({
  name: z.string(),
  language: z.custom<Language>(isLanguage),
  theme: z.enum(['auto', 'light', 'dark']),
  shop_name: z.string(),
  time_zone: z.string(),
});

// lucia reads the machine's clock; rows are kept by the product's, as all other times are.
function toStored(luciaTime: Date): number {
  return luciaTime.getTime() + clockOffset();
}

function toSession(id: string, row: z.output<typeof sessionRow>): DatabaseSession {
  return {
    id,
    userId: row.person_id,
    expiresAt: new Date(row.expires_at - clockOffset()),
    attributes: {
      shopId: row.shop_id,
      handle: row.handle,
      device: row.device,
      lastSeenAt: row.last_seen_at,
    },
  };
}

function toUser(row: z.output<typeof sessionWithPersonRow>): DatabaseUser {
  return {
    id: row.person_id,
    attributes: {
      shopId: row.shop_id,
      shopName: row.shop_name,
      timeZone: row.time_zone,
      name: row.name,
      language: row.language,
      theme: row.theme,
    },
  };
}

/**
 * Keeps lucia's sessions in our table. Only a hash of the session id is stored: a stolen database opens no session. The id
 * that lucia knows is the cookie's; rows listed without it carry the hash in its place.
 */
export class HashedSessionAdapter implements Adapter {
  /** @param db gives the handle to use: the connection, or a transaction that the change belongs to */
  constructor(private readonly db: () => Knex) {}

  async getSessionAndUser(
    sessionId: string,
  ): Promise<[session: DatabaseSession | null, user: DatabaseUser | null]> {
    const found: unknown = await this.db()('sessions')
      .join('people', (on) =>
        on.on('people.id', 'sessions.person_id').andOn('people.shop_id', 'sessions.shop_id'),
      )
      .join('shops', 'shops.id', 'sessions.shop_id')
      .where({ 'sessions.id_hash': hashToken(sessionId), 'people.active': true })
      .first(
        'sessions.shop_id',
        'sessions.handle',
        'sessions.person_id',
        'sessions.expires_at',
        'sessions.device',
        'sessions.last_seen_at',
        'people.name',
        'people.language',
        'people.theme',
        'shops.name as shop_name',
        'shops.time_zone',
      );
    if (!found) return [null, null];
    const row = sessionWithPersonRow.parse(found);
    return [toSession(sessionId, row), toUser(row)];
  }

  async getUserSessions(personId: string): Promise<DatabaseSession[]> {
    const rows = await this.db()('sessions').where({ person_id: personId });
    return rows.map((row) => toSession(String(row.id_hash), sessionRow.parse(row)));
  }

  async setSession(session: DatabaseSession): Promise<void> {
    await this.db()('sessions').insert({
      id: newId(),
      shop_id: session.attributes.shopId,
      id_hash: hashToken(session.id),
      handle: session.attributes.handle,
      person_id: session.userId,
      expires_at: toStored(session.expiresAt),
      last_seen_at: session.attributes.lastSeenAt,
      device: session.attributes.device,
      created_at: session.attributes.lastSeenAt,
    });
  }

  async updateSessionExpiration(sessionId: string, expiresAt: Date): Promise<void> {
    await this.db()('sessions')
      .where({ id_hash: hashToken(sessionId) })
      .update({ expires_at: toStored(expiresAt) });
  }

  async deleteSession(sessionId: string): Promise<void> {
    await this.db()('sessions')
      .where({ id_hash: hashToken(sessionId) })
      .delete();
  }

  async deleteUserSessions(personId: string): Promise<void> {
    await this.db()('sessions').where({ person_id: personId }).delete();
  }

  async deleteExpiredSessions(): Promise<void> {
    await this.db()('sessions').where('expires_at', '<=', now()).delete();
  }
}
