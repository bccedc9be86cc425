import type { Viewer } from '../../server/auth/viewer.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { AppError } from '../../server/errors.ts';
import type { MyPageForm } from './profile.schema.ts';
import { changeOwnPassword, changeOwnProfile } from './profile.service.ts';
import { endOwnSession, endOwnSessions } from './session.service.ts';
import { addOwnToken, endOwnToken } from './token.service.ts';

/** What a form of "My page" did: a word for the sentence on the page, and a new token to show once. */
export interface MyPageOutcome {
  done: 'settings' | 'password' | 'session' | 'everywhere' | 'token' | null;
  newToken: string | null;
}

/** Ending what has ended already is no fault on a page that was open meanwhile. */
async function endQuietly(end: Promise<void>): Promise<void> {
  try {
    await end;
  } catch (thrown) {
    if (!(thrown instanceof AppError) || thrown.code !== 'not-found') throw thrown;
  }
}

/** @throws AppError `invalid`, `too-many`, `not-now` */
export async function useMyPageForm(
  scope: ShopScope,
  viewer: Viewer,
  form: MyPageForm & { network: string },
): Promise<MyPageOutcome> {
  switch (form.do) {
    case 'settings':
      await changeOwnProfile(scope, viewer, { language: form.language, theme: form.theme });
      return { done: 'settings', newToken: null };
    case 'password':
      await changeOwnPassword(scope, viewer, form);
      return { done: 'password', newToken: null };
    case 'end-session':
      await endQuietly(endOwnSession(scope, viewer, form.handle));
      return { done: 'session', newToken: null };
    case 'end-all':
      await endOwnSessions(scope, viewer);
      return { done: 'everywhere', newToken: null };
    case 'add-token': {
      const { token } = await addOwnToken(scope, viewer, form.name);
      return { done: null, newToken: token };
    }
    case 'end-token':
      await endQuietly(endOwnToken(scope, viewer, form.id));
      return { done: 'token', newToken: null };
  }
}
