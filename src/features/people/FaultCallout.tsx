import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import type { SubmissionFault } from '../../components/island/use-submission.ts';
import { Callout } from '../../components/ui/Callout.tsx';

interface Props {
  readonly fault: SubmissionFault | null;
  readonly children?: ReactNode;
}

/** Why something was not saved, and that nothing typed is lost. */
export function FaultCallout({ fault, children }: Props) {
  const { t } = useTranslation('people');
  if (!fault) return null;
  const words = {
    offline: () => t('form.offline'),
    'signed out': () => t('form.signIn'),
    refused: () => (fault.kind === 'refused' ? fault.problem.detail : ''),
  }[fault.kind]();
  return (
    <Callout tone="caution" title={t('form.notSaved')} live="assertive">
      <p>{words}</p>
      {children}
    </Callout>
  );
}
