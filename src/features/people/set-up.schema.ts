import { z } from 'zod';
import { currencies } from '../../i18n/currencies.ts';
import { languages } from '../../i18n/languages.ts';
import { isTimeZone } from '../../i18n/time-zones.ts';
import { personNameSchema } from './person.schema.ts';
import { mailAddressSchema, newPasswordSchema } from './sign-in.schema.ts';
import './schema-settings.ts';

/** What makes a shop and its first admin. */
export const setUpSchema = z.object({
  shopName: personNameSchema,
  timeZone: z.string().refine(isTimeZone, { error: 'not-a-time-zone' }),
  language: z.enum(languages),
  currency: z.enum(currencies),
  name: personNameSchema,
  email: mailAddressSchema,
  password: newPasswordSchema,
});
export type SetUp = z.output<typeof setUpSchema>;
