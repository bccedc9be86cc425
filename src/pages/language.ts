import type { APIRoute } from 'astro';
import { isLanguage } from '../i18n/languages.ts';
import { config } from '../server/env.ts';
import { AppError } from '../server/errors.ts';
import { localPath } from '../server/http/local-path.ts';
import { languageCookie } from '../server/http/reader.ts';

const aYear = 31_536_000;

/** A plain form with the language and the page to go back to. */
export const POST: APIRoute = async ({ request, cookies, redirect }) => {
  const form = await request.formData();
  const language = form.get('language');
  if (!isLanguage(language))
    throw new AppError('invalid', { fields: [{ pointer: '#/language', code: 'not-a-choice' }] });
  cookies.set(languageCookie, language, {
    path: '/',
    maxAge: aYear,
    httpOnly: true,
    sameSite: 'lax',
    secure: config().appUrl.startsWith('https://'),
  });
  return redirect(localPath(form.get('next')), 303);
};
