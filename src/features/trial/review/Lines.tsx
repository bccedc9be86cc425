import { useTranslation } from 'react-i18next';

interface Props {
  readonly of: readonly string[];
}

/** What was said, a line each; that nothing was, where nothing was. */
export function Lines({ of }: Props) {
  const { t } = useTranslation('plan-review');
  if (of.length === 0) return <p className="text-steel">{t('nothing')}</p>;
  return of.map((line) => <p key={line}>{line}</p>);
}
