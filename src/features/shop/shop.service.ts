import { recordActivity } from '../../server/db/activity-log.ts';
import { inTransaction } from '../../server/db/in-transaction.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { AppError } from '../../server/errors.ts';
import { parsePhone } from '../people/phone.ts';
import { findShop, isTextNumberTaken, updateShop } from './shop.repository.ts';
import {
  type ChangeShop,
  type PublicShop,
  publicShopSchema,
  type ShopFields,
  shopFaults,
} from './shop.schema.ts';
import type { Shop } from './shop.ts';

export async function readShop(scope: ShopScope): Promise<PublicShop> {
  return publicShopSchema.parse(await findShop(scope));
}

function refuse(field: string, code: string): AppError {
  return new AppError('invalid', { fields: [{ pointer: `#/${field}`, code }] });
}

/** The typed number in E.164 form. One written without its country is read as of the number before. */
function checkNumber(typed: string | null, before: Shop): string | null {
  if (typed === null) return null;
  const number = parsePhone(typed, before.textNumber);
  if (number === null) throw refuse('textNumber', 'not-a-phone');
  return number;
}

function differing(before: Shop, wished: Omit<ChangeShop, 'revision'>): Partial<ShopFields> {
  return Object.fromEntries(
    Object.entries(wished).filter(
      ([field, value]) => value !== undefined && value !== before[field as keyof ShopFields],
    ),
  );
}

/** What the log may keep of a change: figures and codes as they were and as they are, of words only that they changed. */
function describeChange(before: Shop, change: Partial<ShopFields>) {
  const worded = ['name', 'textNumber', 'reviewStatement'];
  const fields = Object.keys(change).sort();
  return {
    fields,
    values: Object.fromEntries(
      Object.entries(change)
        .filter(([field]) => !worded.includes(field))
        .map(([field, after]) => [field, { before: before[field as keyof ShopFields], after }]),
    ),
  };
}

/**
 * Changes the shop's rules, if they are still as the reader saw them.
 * @throws AppError `invalid` naming the field, `changed-meanwhile` with the present rules
 */
export async function changeShop(scope: ShopScope, input: ChangeShop): Promise<PublicShop> {
  const { revision, ...wished } = input;
  return inTransaction(scope, async (inner) => {
    const before = await findShop(inner);
    const number =
      wished.textNumber === undefined ? {} : { textNumber: checkNumber(wished.textNumber, before) };
    const change = differing(before, { ...wished, ...number });
    const [fault] = shopFaults({ ...before, ...change });
    if (fault) throw refuse(fault.field, fault.code);
    if (change.textNumber && (await isTextNumberTaken(inner, change.textNumber))) {
      throw refuse('textNumber', 'taken');
    }
    if (!(await updateShop(inner, revision, change))) {
      throw new AppError('changed-meanwhile', { present: await readShop(inner) });
    }
    const details = describeChange(before, change);
    await recordActivity(inner, { kind: 'shop.changed', subjectId: inner.shopId, details });
    return readShop(inner);
  });
}

export async function readShopLanguage(scope: ShopScope): Promise<Shop['language']> {
  return (await findShop(scope)).language;
}
