import {
  createApiToken,
  type ListedToken,
  listApiTokens,
  revokeApiToken,
} from '../../server/auth/api-tokens.ts';
import { requirePermission, type Viewer, viewerMay } from '../../server/auth/viewer.ts';
import { recordActivity } from '../../server/db/activity-log.ts';
import { inTransaction } from '../../server/db/in-transaction.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { AppError } from '../../server/errors.ts';
import { mostTokens } from './profile.schema.ts';

/** None for whoever may hold none. */
export async function listOwnTokens(scope: ShopScope, viewer: Viewer): Promise<ListedToken[]> {
  return viewerMay(viewer, 'token.own') ? listApiTokens(scope, viewer.personId) : [];
}

/**
 * Makes a token for the person's own programs. Its text is in this answer and nowhere else.
 * @throws AppError `forbidden`; `not-now` when the person has twenty already
 */
export async function addOwnToken(
  scope: ShopScope,
  viewer: Viewer,
  name: string,
): Promise<{ id: string; token: string; expiresAt: number }> {
  requirePermission(viewer, 'token.own');
  return inTransaction(scope, async (inner) => {
    const tokens = await listApiTokens(inner, viewer.personId);
    if (tokens.length >= mostTokens) throw new AppError('not-now', { detail: 'too many tokens' });
    const made = await createApiToken(inner, { personId: viewer.personId, name });
    await recordActivity(inner, { kind: 'token.added', subjectId: made.id });
    return made;
  });
}

/** @throws AppError `not-found` when it is not the person's, or has ended already */
export async function endOwnToken(scope: ShopScope, viewer: Viewer, id: string): Promise<void> {
  await inTransaction(scope, async (inner) => {
    const revoked = await revokeApiToken(inner, { personId: viewer.personId, id });
    if (!revoked) throw new AppError('not-found');
    await recordActivity(inner, { kind: 'token.ended', subjectId: id });
  });
}
