import type { ResourceLanguage } from 'i18next';
import { useState } from 'react';
import { useTranslation } from 'react-i18next';
import { v7 } from 'uuid';
import { IslandRoot } from '../../components/island/IslandRoot.tsx';
import { useSubmission } from '../../components/island/use-submission.ts';
import { ActionBar } from '../../components/ui/ActionBar.tsx';
import { Button } from '../../components/ui/Button.tsx';
import { ButtonLink } from '../../components/ui/ButtonLink.tsx';
import { Checkbox } from '../../components/ui/Checkbox.tsx';
import type { Language } from '../../i18n/languages.ts';
import { FaultCallout } from './FaultCallout.tsx';
import { PersonFields } from './PersonFields.tsx';
import { addPersonCall } from './people.queries.ts';
import { addPersonSchema } from './person.schema.ts';
import { newPersonValues, type PersonFormValues, toPersonFields } from './person-form.ts';
import type { Reach } from './reach.ts';
import { usePersonForm } from './use-person-form.tsx';

interface Props {
  readonly language: Language;
  readonly words: ResourceLanguage;
  readonly shopLanguage: Language;
  readonly reach: Reach;
}

/** The form that adds a person and, if wished, asks and invites them at once. */
export function NewPerson({ language, words, ...rest }: Props) {
  return (
    <IslandRoot language={language} words={words}>
      <NewPersonForm {...rest} />
    </IslandRoot>
  );
}

function NewPersonForm({ shopLanguage, reach }: Pick<Props, 'shopLanguage' | 'reach'>) {
  const { t } = useTranslation('people');
  const { form, showRefusals } = usePersonForm(newPersonValues(shopLanguage));
  const { busy, fault, submit } = useSubmission(showRefusals);
  // Made here, so that sending again after a broken line adds nobody twice.
  const [id] = useState(() => v7());

  const save = (values: PersonFormValues) =>
    submit(async () => {
      const fields = toPersonFields(values);
      const person = await addPersonCall(addPersonSchema.parse({ ...fields, id, invite: values.invite }));
      window.location.assign(`/people/${person.id}`);
    });

  return (
    <form noValidate className="sheet grid max-w-180 gap-6" onSubmit={form.handleSubmit(save)}>
      <PersonFields form={form} reach={reach} phoneShown={null} phoneHidden={false} />
      <Checkbox
        id="invite"
        label={t('form.invite')}
        help={t('form.inviteHelp')}
        {...form.register('invite')}
      />
      <FaultCallout fault={fault} />
      <ActionBar secondary={<ButtonLink href="/people">{t('form.cancel')}</ButtonLink>}>
        <Button kind="primary" type="submit" busy={busy} busyLabel={t('form.saving')}>
          {t('form.add')}
        </Button>
      </ActionBar>
    </form>
  );
}
