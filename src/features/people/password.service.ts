import { hashPassword } from '../../server/auth/password.ts';
import { AppError } from '../../server/errors.ts';
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
