import { createLink, openLink, scopeOfLink } from '../../server/auth/links.ts';
import { countTry } from '../../server/auth/rate-limits.ts';
import { now } from '../../server/clock.ts';
import { recordActivity } from '../../server/db/activity-log.ts';
import { inTransaction } from '../../server/db/in-transaction.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { config } from '../../server/env.ts';
import { AppError } from '../../server/errors.ts';
import { findShop } from '../shop/shop.repository.ts';
import { findTrialOf } from '../trial/trial-reader.service.ts';
import { readVerdict } from './read-verdict.service.ts';
import { listShares, revokeShare } from './share.repository.ts';
import type { MadeShare } from './share.schema.ts';
import { findVerdict } from './verdict.repository.ts';
import type { VerdictView } from './verdict-view.ts';
import { withoutPeople } from './without-people.ts';

/** Long enough for a decision that has to go round; a new one is made in a moment. */
const lifetime = 90 * 24 * 3_600_000;
/** More open links than this nobody keeps in view. */
const mostLinks = 10;

/**
 * Makes a link by which anybody may read the verdict of a trial, without signing in.
 * @throws AppError `not-found`; `not-now` where there is no verdict, or too many links are open
 */
export function shareVerdict(scope: ShopScope, trialId: string): Promise<MadeShare> {
  return inTransaction(scope, async (inner) => {
    const trial = await findTrialOf(inner, trialId);
    if (!(await findVerdict(inner, trial.id))) throw new AppError('not-now', { detail: 'no verdict yet' });
    if ((await listShares(inner, trial.id)).length >= mostLinks)
      throw new AppError('not-now', { detail: 'ten links are open already' });
    const { id, token } = await createLink(inner, { purpose: 'share', trialId: trial.id, lifetime });
    await recordActivity(inner, { kind: 'verdict.shared', subjectId: id, trialId: trial.id });
    const madeAt = now();
    return { id, address: `${config().appUrl}/s/${token}`, madeAt, endsAt: madeAt + lifetime };
  });
}

/** Ends such a link. @throws AppError `not-found` for a link that is none, or of another trial */
export function endShare(scope: ShopScope, which: { trialId: string; id: string }): Promise<void> {
  return inTransaction(scope, async (inner) => {
    const trial = await findTrialOf(inner, which.trialId);
    if (!(await revokeShare(inner, { trialId: trial.id, id: which.id }))) throw new AppError('not-found');
    await recordActivity(inner, { kind: 'verdict.share-ended', subjectId: which.id, trialId: trial.id });
  });
}

/**
 * What a reader by link sees: the newest verdict, without anything that may name a person.
 * @throws AppError `gone` for a link that opens nothing, without saying why; `too-many`
 */
export async function readShared(visit: {
  token: string;
  network: string;
  language: string;
}): Promise<{ view: VerdictView; shopName: string; timeZone: string }> {
  await countTry('link', visit.network);
  const link = await openLink(visit.token, 'share');
  if (link.trialId === null) throw new AppError('gone');
  const scope = scopeOfLink(link);
  const view = await readVerdict(scope, { trialId: link.trialId, language: visit.language }, null);
  if (!view) throw new AppError('gone');
  const { name, timeZone } = await findShop(scope);
  return { view: withoutPeople(view), shopName: name, timeZone };
}
