import { useTranslation } from 'react-i18next';
import { Callout } from '../../../../components/ui/Callout.tsx';
import { useStanding } from './standing.tsx';

interface Props {
  readonly gapCount: number;
}

/** Why the start did not happen: something is still to do, or the server said no. */
export function StartFault({ gapCount }: Props) {
  const { t } = useTranslation('wizard-safety');
  const { fault, isChecked } = useStanding();
  if (fault) {
    const words = {
      offline: () => t('start.offline'),
      'signed out': () => t('start.signedOut'),
      refused: () => (fault.kind === 'refused' ? fault.problem.detail : ''),
    }[fault.kind]();
    return (
      <Callout tone="caution" title={t('start.fault')} live="assertive">
        {words}
      </Callout>
    );
  }
  if (!isChecked || gapCount === 0) return null;
  return (
    <Callout tone="caution" live="polite">
      {t('start.todo', { count: gapCount })}
    </Callout>
  );
}
