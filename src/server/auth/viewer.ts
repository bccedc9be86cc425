import type { Language } from '../../i18n/languages.ts';
import { database } from '../db/connection.ts';
import type { ShopScope } from '../db/scope.ts';
import { AppError } from '../errors.ts';
import { isRole, type Permission, type Role, rolesMay } from './permissions.ts';

/** The person behind a request, by session or token. */
export interface Viewer {
  personId: string;
  shopId: string;
  shopName: string;
  timeZone: string;
  name: string;
  language: Language;
  theme: 'auto' | 'light' | 'dark';
  roles: Role[];
  /** The session's name in lists; null when the person came with a token. */
  sessionHandle: string | null;
}

/** The roles a person holds now; read with each request, so that a change counts at once. */
export async function rolesOfPerson(shopId: string, personId: string): Promise<Role[]> {
  const held: unknown[] = await database()('person_roles')
    .where({ shop_id: shopId, person_id: personId })
    .orderBy('role')
    .pluck('role');
  return held.filter(isRole);
}

export function viewerMay(viewer: Viewer | null, permission: Permission): boolean {
  return viewer !== null && rolesMay(viewer.roles, permission);
}

/** @throws AppError `not-signed-in` or `forbidden` */
export function requirePermission(viewer: Viewer | null, permission: Permission): Viewer {
  if (!viewer) throw new AppError('not-signed-in');
  if (!viewerMay(viewer, permission)) throw new AppError('forbidden', { detail: `lacks ${permission}` });
  return viewer;
}

/** The one shop that this person may touch. */
export function scopeOf(viewer: Viewer): ShopScope {
  return { db: database(), shopId: viewer.shopId, actor: { kind: 'person', id: viewer.personId } };
}
