import type { Translate } from '../../i18n/translator.ts';

export interface PosterWord {
  word: string;
  meaning: string;
}

/** What one may text back and what it does, the most usual first. STOP stands last, with what it does not do. */
export function posterWords(t: Translate): PosterWord[] {
  const word = (name: 'skip' | 'later' | 'problem') => t(`shop:poster.word.${name}`);
  return [
    { word: '41.5', meaning: t('shop:poster.number') },
    { word: word('skip'), meaning: t('shop:poster.skip') },
    { word: word('later'), meaning: t('shop:poster.later', { word: word('later') }) },
    { word: word('problem'), meaning: t('shop:poster.problem', { word: word('problem') }) },
    { word: '?', meaning: t('shop:poster.help') },
    { word: 'STOP', meaning: t('shop:poster.stop') },
  ];
}
