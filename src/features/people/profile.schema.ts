import { z } from 'zod';
import { languages } from '../../i18n/languages.ts';
import { newPasswordSchema } from './sign-in.schema.ts';
import './schema-settings.ts';

export const themes = ['auto', 'light', 'dark'] as const;
export type Theme = (typeof themes)[number];

/** What people set for themselves; what is left out stays. */
export const changeProfileSchema = z.strictObject({
  language: z.enum(languages).optional(),
  theme: z.enum(themes).optional(),
});
export type ChangeProfile = z.output<typeof changeProfileSchema>;

export const profileSchema = z.object({
  name: z.string(),
  language: z.enum(languages),
  theme: z.enum(themes),
});

export const ownSessionSchema = z.object({
  handle: z.string(),
  device: z.string(),
  createdAt: z.number(),
  lastSeenAt: z.number(),
  expiresAt: z.number(),
  isThisOne: z.boolean(),
});

/** A person holds no more tokens than this at a time. */
export const mostTokens = 20;

export const addTokenSchema = z.strictObject({ name: z.string().trim().min(1).max(60) });

export const listedTokenSchema = z.object({
  id: z.string(),
  prefix: z.string(),
  name: z.string(),
  createdAt: z.number(),
  expiresAt: z.number(),
  lastUsedAt: z.number().nullable(),
});

/** The only answer that ever holds the token itself. */
export const newTokenSchema = z.object({ id: z.string(), token: z.string(), expiresAt: z.number() });

/** The forms of "My page": one address, told apart by the button that was pressed. */
export const myPageFormSchema = z.discriminatedUnion('do', [
  z.object({ do: z.literal('settings'), language: z.enum(languages), theme: z.enum(themes) }),
  z.object({
    do: z.literal('password'),
    current: z.string().min(1).max(1_000),
    password: newPasswordSchema,
  }),
  z.object({ do: z.literal('end-session'), handle: z.string().max(60) }),
  z.object({ do: z.literal('end-all') }),
  z.object({ do: z.literal('add-token'), name: z.string().trim().min(1).max(60) }),
  z.object({ do: z.literal('end-token'), id: z.string().max(60) }),
]);
export type MyPageForm = z.output<typeof myPageFormSchema>;
