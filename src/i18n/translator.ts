import i18next, { type TFunction } from 'i18next';
import { defaultLanguage, type Language } from './languages.ts';
import { type Namespaces, namespaces } from './namespaces.ts';
import { resources } from './resources.ts';

export type Translate = TFunction<Namespaces>;

const instance = i18next.createInstance({
  resources,
  fallbackLng: defaultLanguage,
  ns: [...namespaces],
  defaultNS: 'common',
  initAsync: false,
  returnNull: false,
  // Astro and React escape what they write; texts and mails are plain.
  interpolation: { escapeValue: false },
});
instance.init();

/** The words in one language, for pages, texts and mails: `t('errors:forbidden')`. */
export function translatorFor(language: Language): Translate {
  return instance.getFixedT(language, namespaces);
}

/** The words of a plan's review as its island has them, for a page that says the same. */
export function reviewWordsFor(language: Language): TFunction<'plan-review'> {
  return instance.getFixedT(language, 'plan-review');
}
