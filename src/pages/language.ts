import type { APIRoute } from 'astro';
import { z } from 'zod';
import { changeOwnProfile } from '../features/people/profile.service.ts';
import { languages } from '../i18n/languages.ts';
import { scopeOf } from '../server/auth/viewer.ts';
import { config } from '../server/env.ts';
import { AppError } from '../server/errors.ts';
import { localPath } from '../server/http/local-path.ts';
import { readForm } from '../server/http/read-form.ts';
import { languageCookie } from '../server/http/reader.ts';

const aYear = 31_536_000;
const choice = z.object({ language: z.enum(languages), next: z.string().optional() });

/** A plain form with the language and the page to go back to. A person who is signed in keeps the choice for good. */
export const POST: APIRoute = async ({ request, cookies, redirect, locals: { viewer } }) => {
  const { data, problems } = await readForm(request, choice);
  if (!data) throw new AppError('invalid', { fields: problems });
  if (viewer) await changeOwnProfile(scopeOf(viewer), viewer, { language: data.language });
  cookies.set(languageCookie, data.language, {
    path: '/',
    maxAge: aYear,
    httpOnly: true,
    sameSite: 'lax',
    secure: config().appUrl.startsWith('https://'),
  });
  return redirect(localPath(data.next), 303);
};
