import { z } from 'zod';
import { languages } from '../../i18n/languages.ts';
import { keyedHash } from '../../server/auth/token.ts';
import { flag, jsonColumn, moment } from '../../server/db/columns.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { storedWorkHoursSchema } from '../people/work-hours.ts';
import type { Addressee } from './send-guard.ts';

const rowSchema = z.object({
  name: z.string(),
  phone: z.string().nullable(),
  email: z.string().nullable(),
  language: z.enum(languages),
  plain_letters: flag,
  consent: z.enum(['unasked', 'asked', 'agreed', 'opted out']),
  asker_name: z.string().nullable(),
  active: flag,
  work_hours: jsonColumn(storedWorkHoursSchema),
  shop_name: z.string(),
  shop_plain_letters: flag,
  time_zone: z.string(),
  quiet_from_minute: z.number().nullable(),
  quiet_to_minute: z.number().nullable(),
});

/** A person with all that a message to them depends on. */
export type FullAddressee = Addressee & {
  personId: string;
  name: string;
  shopName: string;
  language: z.output<typeof rowSchema>['language'];
  plainLetters: boolean;
  /** Who last asked for consent. */
  askerName: string | null;
};

/** @returns null where the shop has no such person */
export async function findAddressee(scope: ShopScope, personId: string): Promise<FullAddressee | null> {
  const { db, shopId } = scope;
  const found = await db('people')
    .join('shops', 'shops.id', 'people.shop_id')
    .leftJoin('people as asker', (asker) =>
      asker.on('asker.shop_id', 'people.shop_id').andOn('asker.id', 'people.asked_by'),
    )
    .where({ 'people.shop_id': shopId, 'people.id': personId })
    .first(
      'people.name',
      'people.phone',
      'people.email',
      'people.language',
      'people.plain_letters',
      'people.consent',
      'asker.name as asker_name',
      'people.active',
      'people.work_hours',
      'shops.name as shop_name',
      'shops.plain_letters as shop_plain_letters',
      'shops.time_zone',
      'shops.quiet_from_minute',
      'shops.quiet_to_minute',
    );
  if (!found) return null;
  const row = rowSchema.parse(found);
  const { quiet_from_minute: fromMinute, quiet_to_minute: toMinute } = row;
  return {
    personId,
    name: row.name,
    shopName: row.shop_name,
    phone: row.phone,
    email: row.email,
    language: row.language,
    // Marked Vietnamese is the person's choice; everything else follows the shop.
    plainLetters: row.language === 'vi' ? row.plain_letters : row.shop_plain_letters,
    consent: row.consent,
    askerName: row.asker_name,
    active: row.active,
    isSuppressed: row.phone !== null && (await isPhoneSuppressed(scope, row.phone)),
    hours: {
      spans: row.work_hours.spans,
      quiet: fromMinute === null || toMinute === null ? null : { fromMinute, toMinute },
      timeZone: row.time_zone,
    },
    lastTextedAt: await findLastTextedAt(scope, personId),
  };
}

async function findLastTextedAt(scope: ShopScope, personId: string): Promise<number | null> {
  const found = await scope
    .db('inbox_texts')
    .where({ shop_id: scope.shopId, person_id: personId })
    .max('received_at as at')
    .first();
  return moment.nullable().parse(found?.['at'] ?? null);
}

function hashPhone(phone: string): string {
  return keyedHash('suppressed-phone', phone);
}

/** Whether this number opted out of the shop's texts and has not let them in again. */
export async function isPhoneSuppressed(scope: ShopScope, phone: string): Promise<boolean> {
  const found = await scope
    .db('suppressed_phones')
    .where({ shop_id: scope.shopId, phone_hmac: hashPhone(phone) })
    .first('id');
  return found !== undefined;
}

/** Keeps a number from the shop's texts, in a form that outlives the person and tells nobody the number. */
export async function suppressPhone(
  scope: ShopScope,
  row: { id: string; phone: string; at: number },
): Promise<void> {
  await scope
    .db('suppressed_phones')
    .insert({ id: row.id, shop_id: scope.shopId, phone_hmac: hashPhone(row.phone), created_at: row.at })
    .onConflict(['shop_id', 'phone_hmac'])
    .ignore();
}

export async function liftSuppression(scope: ShopScope, phone: string): Promise<void> {
  await scope
    .db('suppressed_phones')
    .where({ shop_id: scope.shopId, phone_hmac: hashPhone(phone) })
    .delete();
}
