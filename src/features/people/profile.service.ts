import { checkPassword } from '../../server/auth/password.ts';
import { countSignInTry, forgetSignInTries } from '../../server/auth/rate-limits.ts';
import { findByPerson } from '../../server/auth/sign-in-address.ts';
import type { Viewer } from '../../server/auth/viewer.ts';
import { recordActivity } from '../../server/db/activity-log.ts';
import { inTransaction } from '../../server/db/in-transaction.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { AppError } from '../../server/errors.ts';
import { prepareNewPassword, replacePassword } from './password.service.ts';
import { updateProfile } from './profile.repository.ts';
import type { ChangeProfile } from './profile.schema.ts';
import { endOwnOtherSessions } from './session.service.ts';

/** Changes a person's own language or theme; answers how things stand then. */
export async function changeOwnProfile(
  scope: ShopScope,
  viewer: Viewer,
  change: ChangeProfile,
): Promise<Pick<Viewer, 'name' | 'language' | 'theme'>> {
  const { name } = viewer;
  const language = change.language ?? viewer.language;
  const theme = change.theme ?? viewer.theme;
  if (language !== viewer.language || theme !== viewer.theme) {
    await inTransaction(scope, async (inner) => {
      await updateProfile(inner, viewer.personId, { language, theme });
      await recordActivity(inner, {
        kind: 'profile.changed',
        subjectId: viewer.personId,
        details: { language, theme },
      });
    });
  }
  return { name, language, theme };
}

/**
 * Changes a person's own password and ends their other sessions. A wrong present password counts as a try to sign in, so
 * that a screen left open is no place to guess it.
 * @throws AppError `invalid` at `current` or `password`, `too-many`
 */
export async function changeOwnPassword(
  scope: ShopScope,
  viewer: Viewer,
  change: { current: string; password: string; network: string },
): Promise<void> {
  const person = await findByPerson(viewer);
  if (!person) throw new AppError('forbidden', { detail: 'has no sign-in' });
  const who = { address: person.email, network: change.network };
  await countSignInTry(who);
  if (!(await checkPassword(person.passwordHash, change.current))) {
    throw new AppError('invalid', { fields: [{ pointer: '#/current', code: 'wrong-password' }] });
  }
  await forgetSignInTries(who);
  const passwordHash = await prepareNewPassword(change.password, person);
  await inTransaction(scope, async (inner) => {
    await replacePassword(inner, { personId: viewer.personId, passwordHash });
    await endOwnOtherSessions(inner, viewer);
    await recordActivity(inner, { kind: 'password.changed', subjectId: viewer.personId });
  });
}
