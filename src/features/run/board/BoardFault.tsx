import { useTranslation } from 'react-i18next';
import type { SubmissionFault } from '../../../components/island/use-submission.ts';
import { Callout } from '../../../components/ui/Callout.tsx';

/** Why something was not done, and that what was typed is still there. */
export function BoardFault({ fault }: { readonly fault: SubmissionFault | null }) {
  const { t } = useTranslation('board');
  if (!fault) return null;
  const words = {
    offline: () => t('fault.offline'),
    'signed out': () => t('fault.signedOut'),
    refused: () => (fault.kind === 'refused' ? fault.problem.detail : ''),
  }[fault.kind]();
  return (
    <Callout tone="caution" title={t('fault.title')} live="assertive">
      {words}
    </Callout>
  );
}
