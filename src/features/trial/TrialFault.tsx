import { useTranslation } from 'react-i18next';
import type { SubmissionFault } from '../../components/island/use-submission.ts';
import { Callout } from '../../components/ui/Callout.tsx';

/** Why something about a trial was not done: the server's words, no connection, or a session that has ended. */
export function TrialFault({ fault }: { readonly fault: SubmissionFault | null }) {
  const { t } = useTranslation('trials');
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
