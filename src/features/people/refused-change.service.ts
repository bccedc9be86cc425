import type { ShopScope } from '../../server/db/scope.ts';
import { AppError } from '../../server/errors.ts';
import { listOpenRuns } from './open-runs.repository.ts';
import { findPerson } from './person.repository.ts';
import { toPublicPerson } from './public-person.ts';
import type { PeopleReader } from './reach.ts';

/**
 * Says why a conditional change touched no row: somebody was faster, open runs are in the way, or it is the last admin.
 * @param which.leaves whether the change takes the person away from runs
 */
export async function explainRefusedChange(
  scope: ShopScope,
  which: { id: string; revision: number; active?: boolean; leaves: boolean; reader: PeopleReader },
): Promise<AppError> {
  const person = await findPerson(scope, which.id);
  if (!person) return new AppError('not-found');
  const wasOther = which.active !== undefined && person.active !== which.active;
  if (person.revision !== which.revision || person.erasedAt !== null || wasOther) {
    return new AppError('changed-meanwhile', { present: { person: toPublicPerson(person, which.reader) } });
  }
  const openRuns = which.leaves ? await listOpenRuns(scope, which.id) : [];
  if (openRuns.length > 0) return new AppError('open-runs', { present: { openRuns } });
  return new AppError('last-admin');
}
