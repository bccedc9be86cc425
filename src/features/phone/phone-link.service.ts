import { createLink, type Link, openLink, scopeOfLink } from '../../server/auth/links.ts';
import { countTry } from '../../server/auth/rate-limits.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { config } from '../../server/env.ts';
import { AppError } from '../../server/errors.ts';

/** As long as a trial may take; another text brings a new one. */
const lifetime = 14 * 24 * 3_600_000;

/** The address of a person's phone page in a trial. Its token is kept nowhere, so it is told once. */
export async function makePhoneLink(
  scope: ShopScope,
  about: { personId: string; trialId: string },
): Promise<string> {
  const { token } = await createLink(scope, { purpose: 'operator', ...about, lifetime });
  return `${config().appUrl}/t/${token}`;
}

export interface PhoneVisit {
  token: string;
  network: string;
}

/** Who opens the page, in which trial. Looking uses nothing up. @throws AppError `gone`, `too-many` */
export async function openPhone(
  visit: PhoneVisit,
): Promise<{ link: Link; scope: ShopScope; personId: string; trialId: string }> {
  await countTry('link', visit.network);
  const link = await openLink(visit.token, 'operator');
  if (link.personId === null || link.trialId === null) throw new AppError('gone');
  return { link, scope: scopeOfLink(link), personId: link.personId, trialId: link.trialId };
}
