import type { ResourceLanguage } from 'i18next';
import { useState } from 'react';
import { useTranslation } from 'react-i18next';
import { v7 } from 'uuid';
import { IslandRoot } from '../../../components/island/IslandRoot.tsx';
import { useSubmission } from '../../../components/island/use-submission.ts';
import { Button } from '../../../components/ui/Button.tsx';
import type { Language } from '../../../i18n/languages.ts';
import { TrialFault } from '../TrialFault.tsx';
import { createTrialCall } from '../trial.queries.ts';

interface Props {
  readonly language: Language;
  readonly words: ResourceLanguage;
  /** The words of the button: a new trial, or the very first one. */
  readonly label: 'add' | 'addFirst';
}

function NewTrialButton({ label }: Pick<Props, 'label'>) {
  const { t } = useTranslation('trials');
  const { busy, fault, submit } = useSubmission();
  // Made here, so that pressing again after a broken line begins one trial.
  const [id] = useState(() => v7());

  const begin = () =>
    submit(async () => {
      await createTrialCall(id);
      window.location.assign(`/trials/${id}/problem`);
    });
  return (
    <div className="grid gap-3">
      <TrialFault fault={fault} />
      <Button kind="primary" icon="plus" busy={busy} busyLabel={t('adding')} onClick={begin}>
        {t(label)}
      </Button>
    </div>
  );
}

/** Begins a trial and leads to its first question. */
export function NewTrial({ language, words, label }: Props) {
  return (
    <IslandRoot language={language} words={words}>
      <NewTrialButton label={label} />
    </IslandRoot>
  );
}
