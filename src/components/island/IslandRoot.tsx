import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import i18next, { type i18n, type ResourceLanguage } from 'i18next';
import { type ReactNode, useState } from 'react';
import { I18nextProvider } from 'react-i18next';
import type { Language } from '../../i18n/languages.ts';

interface Props {
  language: Language;
  /** The words this island uses, from `wordsFor`: the browser gets no others. */
  words: ResourceLanguage;
  children: ReactNode;
}

function createTranslations({ language, words }: Pick<Props, 'language' | 'words'>): i18n {
  const instance = i18next.createInstance({
    lng: language,
    resources: { [language]: words },
    ns: Object.keys(words),
    defaultNS: 'common',
    initAsync: false,
    returnNull: false,
    interpolation: { escapeValue: false },
    react: { useSuspense: false },
  });
  instance.init();
  return instance;
}

/** Each island is a React root of its own; this gives it its language and its query client, alike on server and browser. */
export function IslandRoot({ language, words, children }: Props) {
  const [translations] = useState(() => createTranslations({ language, words }));
  const [client] = useState(() => new QueryClient({ defaultOptions: { queries: { retry: 2 } } }));
  return (
    <I18nextProvider i18n={translations}>
      <QueryClientProvider client={client}>{children}</QueryClientProvider>
    </I18nextProvider>
  );
}
