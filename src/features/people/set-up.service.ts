import { openLink, scopeOfLink, takeLink } from '../../server/auth/links.ts';
import { countTry } from '../../server/auth/rate-limits.ts';
import type { SessionCookie } from '../../server/auth/session.ts';
import { isAddressTaken } from '../../server/auth/sign-in-address.ts';
import { recordActivity } from '../../server/db/activity-log.ts';
import { inTransaction } from '../../server/db/in-transaction.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { AppError } from '../../server/errors.ts';
import type { Browser } from '../../server/http/browser.ts';
import { newId } from '../../server/ids.ts';
import { storePasswordHash } from './password.repository.ts';
import { prepareNewPassword } from './password.service.ts';
import { insertPerson } from './person.repository.ts';
import { completeShop, readShopName } from './set-up.repository.ts';
import type { SetUp } from './set-up.schema.ts';
import { openSession } from './sign-in.service.ts';
import { usualWorkSpans } from './work-hours.ts';

interface Visit {
  token: string;
  network: string;
}

async function openSetUpLink(visit: Visit) {
  await countTry('link', visit.network);
  return openLink(visit.token, 'setup');
}

/**
 * What is known of the shop to be set up. Looking does not use the link up.
 * @throws AppError `gone`, `too-many`
 */
export async function readSetUpLink(visit: Visit): Promise<{ shopName: string }> {
  const link = await openSetUpLink(visit);
  return { shopName: await readShopName(scopeOfLink(link)) };
}

async function addFirstAdmin(scope: ShopScope, setUp: SetUp, passwordHash: string): Promise<string> {
  const { name, email, language } = setUp;
  const personId = newId();
  await insertPerson(scope, {
    id: personId,
    kind: 'person',
    name,
    email,
    phone: null,
    language,
    plainLetters: true,
    roles: ['admin'],
    safetyPerson: false,
    workSpans: [...usualWorkSpans],
    consent: 'unasked',
  });
  await storePasswordHash(scope, { personId, passwordHash });
  return personId;
}

/**
 * Makes the shop and its first admin, and signs the admin in. Of two visitors with the same link one wins.
 * @throws AppError `gone`, `invalid` (the link can then be used again), `too-many`
 */
export async function setUpShop(visit: Visit, setUp: SetUp, browser: Browser): Promise<SessionCookie> {
  const link = await openSetUpLink(visit);
  const passwordHash = await prepareNewPassword(setUp.password, setUp);
  return inTransaction(scopeOfLink(link), async (scope) => {
    await takeLink(scope, link);
    if (await isAddressTaken(scope.db, setUp.email)) {
      throw new AppError('invalid', { fields: [{ pointer: '#/email', code: 'taken' }] });
    }
    await completeShop(scope, setUp);
    const personId = await addFirstAdmin(scope, setUp, passwordHash);
    await recordActivity(scope, {
      kind: 'shop.set-up',
      subjectId: scope.shopId,
      details: { language: setUp.language, currency: setUp.currency, timeZone: setUp.timeZone },
    });
    await recordActivity(scope, {
      kind: 'person.added',
      subjectId: personId,
      details: { before: [], after: ['admin'] },
    });
    return openSession(scope, personId, browser);
  });
}
