import { useState } from 'react';
import { useWatch } from 'react-hook-form';
import { useTranslation } from 'react-i18next';
import { useSubmission } from '../../../../components/island/use-submission.ts';
import { Button } from '../../../../components/ui/Button.tsx';
import { Choice } from '../../../../components/ui/Choice.tsx';
import { Icon } from '../../../../components/ui/Icon.tsx';
import { formatsFor } from '../../../../i18n/format.ts';
import { type Language, languageNames } from '../../../../i18n/languages.ts';
import { invitePersonCall } from '../../../people/people.queries.ts';
import { type RunWay, runWays } from '../../answer-choices.ts';
import { TrialFault } from '../../TrialFault.tsx';
import { type CrewMember, useWizard } from '../wizard-context.ts';
import type { CrewForm } from './use-crew.tsx';

interface Props {
  readonly form: CrewForm;
  readonly person: CrewMember;
}

/** The ways that are open: a line phone is a phone already; without one in the shop nobody can share it. */
function waysOf(person: CrewMember, people: readonly CrewMember[]): RunWay[] {
  if (person.kind === 'line phone') return ['linePhone', 'paper'];
  const hasLinePhone = people.some(({ kind }) => kind === 'line phone');
  return runWays.filter((way) => way !== 'linePhone' || hasLinePhone);
}

/** How one person gets the runs, and whether they said yes to texts. */
export function PersonWay({ form, person }: Props) {
  const { t, i18n } = useTranslation('wizard-plan');
  const { shop, mayWrite } = useWizard();
  const [consent, setConsent] = useState(person.consent);
  const { busy, fault, submit } = useSubmission();
  const field = `ways.${person.id}` as const;
  const way = useWatch({ control: form.control, name: field });
  const formats = formatsFor(i18n.language as Language, shop.timeZone);

  const ask = () =>
    submit(async () => {
      const { person: asked } = await invitePersonCall(person.id);
      setConsent(asked.consent);
    });
  const takePaper = () => form.setValue(field, 'paper', { shouldDirty: true });
  const wantsTexts = way === 'text' || (way === 'linePhone' && person.kind === 'line phone');
  const name = person.name;
  const words = {
    agreed: () =>
      person.consentAt === null
        ? t('crew.consent.agreed', { name })
        : t('crew.consent.agreedOn', { name, date: formats.date(person.consentAt) }),
    asked: () => t('crew.consent.asked', { name }),
    unasked: () => t('crew.consent.unasked', { name }),
    'opted out': () => t('crew.consent.optedOut', { name }),
  }[consent]();
  const mayAsk = consent === 'unasked' || consent === 'asked';

  return (
    <div className="grid gap-3">
      <Choice
        id={`way-${person.id}`}
        legend={t('crew.way', { name, language: languageNames[person.language] })}
        options={waysOf(person, shop.people).map((value) => ({ value, label: t(`crew.by.${value}`) }))}
        {...form.register(field)}
      />
      {wantsTexts && (
        <div role="status" className="grid gap-2">
          <p className="flex items-start gap-2">
            <span className={consent === 'agreed' ? 'text-good' : 'text-caution'}>
              <Icon name={consent === 'agreed' ? 'good' : 'wait'} />
            </span>
            {words}
          </p>
          {consent === 'agreed' && (
            <p>
              {person.textingHours.length > 0
                ? t('crew.hours', { hours: formats.list([...person.textingHours]) })
                : t('crew.noHours', { name })}
            </p>
          )}
          <TrialFault fault={fault} />
          {mayWrite && consent !== 'agreed' && (
            <div className="button-row">
              {mayAsk && (
                <Button icon="send" busy={busy} busyLabel={t('crew.asking')} onClick={ask}>
                  {consent === 'asked' ? t('crew.askAgain') : t('crew.ask')}
                </Button>
              )}
              <Button icon="paper" onClick={takePaper}>
                {t('crew.usePaper')}
              </Button>
            </div>
          )}
        </div>
      )}
    </div>
  );
}
