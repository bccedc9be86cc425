import { type ReactNode, useState } from 'react';
import { useTranslation } from 'react-i18next';
import { z } from 'zod';
import type { ServerProblem } from '../../components/island/call-server.ts';
import { useSubmission } from '../../components/island/use-submission.ts';
import { ActionBar } from '../../components/ui/ActionBar.tsx';
import { Button } from '../../components/ui/Button.tsx';
import { Callout } from '../../components/ui/Callout.tsx';
import { FaultCallout } from './FaultCallout.tsx';
import { PersonFields } from './PersonFields.tsx';
import { changePersonCall } from './people.queries.ts';
import { changePersonSchema } from './person.schema.ts';
import { changedFields, type PersonFormValues, personValues, toPersonFields } from './person-form.ts';
import type { PersonPart } from './person-part.ts';
import { type PublicPerson, publicPersonSchema } from './public-person.ts';
import { usePersonForm } from './use-person-form.tsx';

const presentSchema = z.object({ person: publicPersonSchema });

function presentOf(problem: ServerProblem): PublicPerson | null {
  const present = presentSchema.safeParse(problem.present);
  return problem.code === 'changed-meanwhile' && present.success ? present.data.person : null;
}

/** The form of somebody who is here already. Two people who change the same person are shown each other's work. */
export function PersonSheet({ person, reader, onChange, say }: PersonPart<ReactNode>) {
  const { t } = useTranslation('people');
  const { form, showRefusals } = usePersonForm(personValues(person));
  const [theirs, setTheirs] = useState<PublicPerson | null>(null);
  const { busy, fault, submit, clearFault } = useSubmission((problem) => {
    setTheirs(presentOf(problem));
    showRefusals(problem);
  });
  const phoneHidden = !reader.seesPhones;

  async function send(values: PersonFormValues, revision: number): Promise<void> {
    const { phone, roles, safetyPerson, email, ...fields } = toPersonFields(values);
    // Who only invites operators sends nothing that is not theirs to change.
    const more = reader.reach === 'everybody' ? { roles, safetyPerson, email } : {};
    const number = phoneHidden && phone.trim() === '' ? {} : { phone };
    const change = changePersonSchema.parse({ ...fields, ...more, ...number, revision });
    const changed = await changePersonCall(person.id, change);
    setTheirs(null);
    form.reset(personValues(changed));
    onChange(changed);
    say('good', t('form.saved'));
  }

  const save = (revision: number) => form.handleSubmit((values) => submit(() => send(values, revision)));

  function takeTheirs(present: PublicPerson): void {
    form.reset(personValues(present));
    onChange(present);
    setTheirs(null);
    clearFault();
  }

  return (
    <form noValidate className="sheet grid gap-6" onSubmit={save(person.revision)}>
      <PersonFields
        form={form}
        reach={reader.reach}
        phoneShown={person.phoneShown}
        phoneHidden={phoneHidden}
      />
      {theirs ? (
        <Callout
          tone="caution"
          live="assertive"
          title={t('form.changedTitle')}
          actions={
            <>
              <Button onClick={() => takeTheirs(theirs)}>{t('form.takeTheirs')}</Button>
              <Button onClick={save(theirs.revision)}>{t('form.keepMine')}</Button>
            </>
          }
        >
          {t('form.changedWords', {
            fields: changedFields(person, theirs)
              .map((field) => t(`changed.${field}`))
              .join(', '),
          })}
        </Callout>
      ) : (
        <FaultCallout fault={fault} />
      )}
      <ActionBar secondary={form.formState.isDirty && <p className="text-steel">{t('form.unsaved')}</p>}>
        <Button kind="primary" type="submit" busy={busy} busyLabel={t('form.saving')}>
          {t('form.save')}
        </Button>
      </ActionBar>
    </form>
  );
}
