import { revokeLinks } from '../../server/auth/links.ts';
import { hashPassword } from '../../server/auth/password.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { AppError } from '../../server/errors.ts';
import { storePasswordHash } from './password.repository.ts';
import { findPasswordFault, type PasswordOwner, passwordLength } from './password-rule.ts';

const limits = { 'too-short': passwordLength.least, 'too-long': passwordLength.most };

/**
 * Hashes a new password that keeps the rule. Slow on purpose: before the transaction, never in it.
 * @throws AppError `invalid` at `pointer`
 */
export async function prepareNewPassword(
  password: string,
  owner: PasswordOwner,
  pointer = '#/password',
): Promise<string> {
  const fault = findPasswordFault(password, owner);
  if (fault === null) return hashPassword(password);
  const limit = fault === 'too-short' || fault === 'too-long' ? limits[fault] : undefined;
  throw new AppError('invalid', {
    fields: [{ pointer, code: fault, ...(limit === undefined ? {} : { values: { limit } }) }],
  });
}

/** Keeps a new password. Links that were sent to choose one end with it: nobody comes back by an older mail. */
export async function replacePassword(
  scope: ShopScope,
  change: { personId: string; passwordHash: string },
): Promise<void> {
  await storePasswordHash(scope, change);
  for (const purpose of ['invite', 'reset'] as const) {
    await revokeLinks(scope, { purpose, personId: change.personId });
  }
}
