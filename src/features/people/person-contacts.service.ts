import type { FieldProblem } from '../../i18n/field-codes.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { AppError } from '../../server/errors.ts';
import { findShop } from '../shop/shop.repository.ts';
import { findTaken } from './person.repository.ts';
import { parsePhone } from './phone.ts';

/**
 * A typed number in E.164 form, or none.
 * @throws AppError `invalid` at /phone
 */
export async function checkPhone(scope: ShopScope, typed: string | null): Promise<string | null> {
  if (typed === null) return null;
  const shop = await findShop(scope);
  const phone = parsePhone(typed, shop.textNumber);
  if (phone === null)
    throw new AppError('invalid', { fields: [{ pointer: '#/phone', code: 'not-a-phone' }] });
  return phone;
}

/**
 * Refuses a number that somebody in the shop has, or a mail address that anybody has. In the transaction of the change.
 * @throws AppError `invalid` naming the field
 */
export async function refuseTaken(
  scope: ShopScope,
  contacts: { phone: string | null; email: string | null; exceptId?: string },
): Promise<void> {
  const { phone, email, exceptId } = contacts;
  const taken = await findTaken(scope, {
    phones: phone === null ? [] : [phone],
    emails: email === null ? [] : [email],
    ...(exceptId === undefined ? {} : { exceptId }),
  });
  const fields: FieldProblem[] = [];
  if (taken.phones.length > 0) fields.push({ pointer: '#/phone', code: 'taken' });
  if (taken.emails.length > 0) fields.push({ pointer: '#/email', code: 'taken' });
  if (fields.length > 0) throw new AppError('invalid', { fields });
}
