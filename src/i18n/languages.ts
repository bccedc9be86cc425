/** The languages of the product, each under its own name, as its speakers write it. */
export const languageNames = {
  en: 'English',
  es: 'Español',
  pl: 'Polski',
  vi: 'Tiếng Việt',
} as const;

export type Language = keyof typeof languageNames;

export const languages = Object.keys(languageNames) as [Language, ...Language[]];

export const defaultLanguage: Language = 'en';

export function isLanguage(text: unknown): text is Language {
  return typeof text === 'string' && Object.hasOwn(languageNames, text);
}

/** The first of our languages that a browser's `Accept-Language` asks for, by its weights; English when there is none. */
export function preferredLanguage(acceptLanguage: string | null): Language {
  const wishes = (acceptLanguage ?? '')
    .split(',')
    .map((part) => {
      const [tag = '', ...parameters] = part.trim().toLowerCase().split(';');
      const weight = parameters.find((parameter) => parameter.trim().startsWith('q='));
      return { language: tag.split('-')[0], weight: weight ? Number(weight.trim().slice(2)) : 1 };
    })
    .filter((wish) => wish.weight > 0)
    .sort((a, b) => b.weight - a.weight);
  for (const { language } of wishes) if (isLanguage(language)) return language;
  return defaultLanguage;
}
