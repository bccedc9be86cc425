import { useTranslation } from 'react-i18next';
import { Icon, type IconName } from '../../components/ui/Icon.tsx';
import type { ConsentState } from './person.ts';

const icons = {
  unasked: 'question',
  asked: 'wait',
  agreed: 'good',
  'opted out': 'stop',
} as const satisfies Record<ConsentState, IconName>;

/** Whether somebody gets texts, as icon and word. */
export function ConsentMark({
  person,
}: {
  readonly person: { readonly consent: ConsentState; readonly phoneShown: string | null };
}) {
  const { t } = useTranslation('people');
  const hasPhone = person.phoneShown !== null;
  return (
    <span className="inline-flex items-center gap-2">
      <Icon name={hasPhone ? icons[person.consent] : 'minus'} size={20} />
      {hasPhone ? t(`consent.${person.consent}`) : t('noPhone')}
    </span>
  );
}
