import { z } from 'zod';
import './schema-settings.ts';
import { passwordLength } from './password-rule.ts';

/** A mail address as it is stored and looked up: in lower case. */
export const mailAddressSchema = z
  .string()
  .trim()
  .toLowerCase()
  .min(1)
  .max(254)
  .pipe(z.email({ error: 'not-an-email' }));

/** A password that somebody claims to know: whatever its length, so that the answer is the same for all. */
const claimedPasswordSchema = z.string().min(1).max(1_000);

export const signInSchema = z.object({
  email: mailAddressSchema,
  password: claimedPasswordSchema,
  next: z.string().max(2_000).optional(),
});

/** A password to be: the rest of the rule needs to know whose it is (`password-rule.ts`). */
export const newPasswordSchema = z.string().min(1).min(passwordLength.least).max(passwordLength.most);

export const resetRequestSchema = z.object({ email: mailAddressSchema });
export const newPasswordFormSchema = z.object({ password: newPasswordSchema });
