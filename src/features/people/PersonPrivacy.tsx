import { type ReactNode, useState } from 'react';
import { useTranslation } from 'react-i18next';
import { useSubmission } from '../../components/island/use-submission.ts';
import { Button } from '../../components/ui/Button.tsx';
import { ButtonLink } from '../../components/ui/ButtonLink.tsx';
import { Callout } from '../../components/ui/Callout.tsx';
import { ConfirmDialog } from '../../components/ui/ConfirmDialog.tsx';
import { FaultCallout } from './FaultCallout.tsx';
import { movePersonCall } from './people.queries.ts';
import type { PersonPart } from './person-part.ts';

/** Hands over what is held about somebody, and erases it. */
export function PersonPrivacy({ person, onChange, say }: PersonPart<ReactNode>) {
  const { t } = useTranslation('people');
  const [asking, setAsking] = useState(false);
  const { busy, fault, submit } = useSubmission(() => setAsking(false));

  const erase = () =>
    submit(async () => {
      const erased = await movePersonCall(person, 'erase');
      setAsking(false);
      onChange(erased);
      say('info', t('privacy.erased', { name: erased.name }));
    });

  return (
    <section className="sheet grid gap-4" aria-labelledby="privacy-title">
      <h2 id="privacy-title">{t('privacy.title')}</h2>
      {person.erased && <Callout tone="info">{t('privacy.erasedWords')}</Callout>}
      <p>{t('privacy.exportWords')}</p>
      <div className="button-row">
        <ButtonLink href={`/api/people/${person.id}/export`} icon="download" download>
          {t('privacy.export')}
        </ButtonLink>
      </div>
      {!person.erased && (
        <>
          <p>{t('privacy.eraseWords')}</p>
          <FaultCallout fault={fault} />
          <div className="button-row">
            <Button icon="remove" onClick={() => setAsking(true)}>
              {t('privacy.erase')}
            </Button>
          </div>
        </>
      )}
      <ConfirmDialog
        open={asking}
        title={t('privacy.eraseTitle', { name: person.name })}
        confirmLabel={t('privacy.eraseNow')}
        busyLabel={t('privacy.erasing')}
        cancelLabel={t('form.cancel')}
        closeLabel={t('close')}
        kind="stop"
        busy={busy}
        onConfirm={erase}
        onCancel={() => setAsking(false)}
      >
        <p>{t('privacy.eraseWords')}</p>
        <p className="mt-2">{t('privacy.eraseAsk')}</p>
      </ConfirmDialog>
    </section>
  );
}
