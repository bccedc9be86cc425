import type { APIContext } from 'astro';
import { formatsFor } from '../../i18n/format.ts';
import { isLanguage, type Language, preferredLanguage } from '../../i18n/languages.ts';
import { translatorFor } from '../../i18n/translator.ts';
import type { Viewer } from '../auth/viewer.ts';

export const languageCookie = 'language';

/** What the reader wishes before we know who it is: an earlier choice, else the browser's list. */
export function wishedLanguage(context: APIContext): Language {
  const chosen = context.cookies.get(languageCookie)?.value;
  return isLanguage(chosen) ? chosen : preferredLanguage(context.request.headers.get('accept-language'));
}

/** Puts language, words and formats at the page's disposal. A person's own language wins over the browser's. */
export function greetReader(context: APIContext, viewer: Viewer | null): void {
  const language = viewer?.language ?? wishedLanguage(context);
  context.locals.language = language;
  context.locals.t = translatorFor(language);
  context.locals.formats = formatsFor(language, viewer?.timeZone ?? 'UTC');
  context.locals.theme = viewer?.theme ?? 'auto';
}
