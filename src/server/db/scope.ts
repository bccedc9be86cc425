import type { Knex } from 'knex';

/** Who does something, as the activity log keeps it: an id, never a name. */
export interface Actor {
  kind: 'person' | 'link' | 'service' | 'worker' | 'command';
  id: string | null;
}

/**
 * What a repository needs to touch data: the handle (the connection or a transaction), the one shop it may see, and who
 * asks. Only `server/auth`, the text webhook and the worker's jobs make one, from a session, a token, a link or a row.
 */
export interface ShopScope {
  readonly db: Knex;
  readonly shopId: string;
  readonly actor: Actor;
}
