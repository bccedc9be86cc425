import type { ResourceLanguage } from 'i18next';
import type { Language } from './languages.ts';
import type { Namespace } from './namespaces.ts';

const files = import.meta.glob<ResourceLanguage[string]>('../../locales/*/*.json', {
  eager: true,
  import: 'default',
});

/** All words of all languages: for the server only. A page hands an island the few it needs (`wordsFor`). */
export const resources: Record<string, ResourceLanguage> = {};
for (const [path, words] of Object.entries(files)) {
  const [language = '', file = ''] = path.split('/').slice(-2);
  resources[language] ??= {};
  resources[language][file.replace(/\.json$/, '')] = words;
}

/** The words of the named namespaces in one language, as an island's property. */
export function wordsFor(language: Language, names: readonly Namespace[]): ResourceLanguage {
  const words = resources[language] ?? {};
  return Object.fromEntries(names.map((name) => [name, words[name]])) as ResourceLanguage;
}
