import { useFieldArray, useWatch } from 'react-hook-form';
import { useTranslation } from 'react-i18next';
import { v7 } from 'uuid';
import { Button } from '../../../../components/ui/Button.tsx';
import { ButtonLink } from '../../../../components/ui/ButtonLink.tsx';
import { Callout } from '../../../../components/ui/Callout.tsx';
import { QuestionPart } from '../QuestionPart.tsx';
import { useWizard } from '../wizard-context.ts';
import { crewMembers } from './crew-lists.ts';
import { PersonWay } from './PersonWay.tsx';
import { ShiftFields } from './ShiftFields.tsx';
import { useCrew } from './use-crew.tsx';

const mostShifts = 4;

/** The shifts with their people, and how each of these gets the runs. */
export function CrewPart() {
  const { t } = useTranslation('wizard-plan');
  const { shop, mayWrite } = useWizard();
  const form = useCrew();
  const { fields, append, remove } = useFieldArray({ control: form.control, name: 'shifts', keyName: 'key' });
  const shifts = useWatch({ control: form.control, name: 'shifts' });
  const members = crewMembers(shifts, shop.people);
  const hasOperator = shop.people.some(({ roles }) => roles.includes('operator'));
  const add = () => append({ id: v7() }, { focusName: `shifts.${fields.length}.name` });

  return (
    <>
      {!hasOperator && (
        <Callout
          tone="info"
          title={t('crew.nobody')}
          actions={<ButtonLink href="/people/new">{t('crew.addPerson')}</ButtonLink>}
        >
          {t('crew.nobodyWords')}
        </Callout>
      )}
      {fields.map((field, place) => (
        <ShiftFields key={field.key} form={form} place={place} onRemove={() => remove(place)} />
      ))}
      {mayWrite && fields.length < mostShifts && (
        <div>
          <Button id="add-shift" icon="plus" onClick={add}>
            {fields.length === 0 ? t('crew.addFirst') : t('crew.add')}
          </Button>
        </div>
      )}
      {members.length > 0 && (
        <QuestionPart title={t('crew.ways')} help={t('crew.waysHelp')}>
          {members.map((person) => (
            <PersonWay key={person.id} form={form} person={person} />
          ))}
        </QuestionPart>
      )}
    </>
  );
}
