import { revokeApiTokens } from '../../server/auth/api-tokens.ts';
import { type LinkPurpose, revokeLinks } from '../../server/auth/links.ts';
import { endAllSessions } from '../../server/auth/session.ts';
import type { ShopScope } from '../../server/db/scope.ts';

/** Ends what a person holds of these kinds of links. */
export async function revokeLinksOf(
  scope: ShopScope,
  personId: string,
  purposes: readonly LinkPurpose[],
): Promise<void> {
  for (const purpose of purposes) await revokeLinks(scope, { purpose, personId });
}

/** Shuts every door a person has: sessions, links and tokens. In the transaction of why they are shut. */
export async function endAccess(scope: ShopScope, personId: string): Promise<void> {
  await endAllSessions(scope, personId);
  await revokeLinksOf(scope, personId, ['invite', 'reset', 'sign-in', 'operator']);
  await revokeApiTokens(scope, personId);
}
