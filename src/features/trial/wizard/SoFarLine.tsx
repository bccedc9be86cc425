import { useTranslation } from 'react-i18next';
import type { Language } from '../../../i18n/languages.ts';
import { aboutMoney, aboutTime } from './so-far-words.ts';
import type { SoFar, WizardShop } from './wizard-context.ts';

interface Props {
  readonly soFar: SoFar | null;
  readonly shop: WizardShop;
}

/** The plan so far in one line: runs, hours, money. */
export function SoFarLine({ soFar, shop }: Props) {
  const { t, i18n } = useTranslation('wizard-frame');
  const language = i18n.language as Language;
  const [best] = soFar?.proposals ?? [];
  if (!best) return <>{soFar?.misfit ? t('soFar.nothingFits') : t('soFar.title')}</>;
  const parts = [
    t('soFar.runs', { count: best.runs }),
    ...(best.minutes === undefined ? [] : [aboutTime(best.minutes, t, language)]),
    ...(best.cost === undefined
      ? []
      : [t('soFar.about', { what: aboutMoney(best.cost, shop.currency, language) })]),
  ];
  return <>{parts.join(' · ')}</>;
}
