import { useFormState, useWatch } from 'react-hook-form';
import { useTranslation } from 'react-i18next';
import { Button } from '../../../../components/ui/Button.tsx';
import { Select } from '../../../../components/ui/Select.tsx';
import { TextInput } from '../../../../components/ui/TextInput.tsx';
import { QuestionPart } from '../QuestionPart.tsx';
import { type CrewMember, useWizard } from '../wizard-context.ts';
import { listCallees, listRunners } from './crew-lists.ts';
import type { CrewForm } from './use-crew.tsx';

interface Props {
  readonly form: CrewForm;
  readonly place: number;
  readonly onRemove: () => void;
}

const toOptions = (people: readonly CrewMember[]) =>
  people.map(({ id, name }) => ({ value: id, label: name }));

/** One shift: its hours, who runs, who measures, whom to call. */
export function ShiftFields({ form, place, onRemove }: Props) {
  const { t } = useTranslation('wizard-plan');
  const { shop, mayWrite } = useWizard();
  const { register, control } = form;
  const name = useWatch({ control, name: `shifts.${place}.name` });
  const { errors } = useFormState({ control, name: `shifts.${place}` });
  const wrong = errors.shifts?.[place];
  const id = `shift-${place}`;
  return (
    <QuestionPart title={name || t('crew.shift', { number: place + 1 })}>
      <div className="grid gap-4 sm:grid-cols-3">
        <TextInput
          id={`${id}-name`}
          label={t('crew.name')}
          autoComplete="off"
          placeholder={t('crew.nameExample')}
          error={wrong?.name?.message}
          {...register(`shifts.${place}.name`)}
        />
        <TextInput
          id={`${id}-from`}
          type="time"
          label={t('crew.from')}
          error={wrong?.from?.message}
          {...register(`shifts.${place}.from`)}
        />
        <TextInput
          id={`${id}-to`}
          type="time"
          label={t('crew.to')}
          error={wrong?.to?.message}
          {...register(`shifts.${place}.to`)}
        />
      </div>
      <div className="grid gap-4 sm:grid-cols-2">
        <Select
          id={`${id}-runs`}
          label={t('crew.runs')}
          emptyLabel={t('crew.pick')}
          options={toOptions(listRunners(shop.people))}
          error={wrong?.runs?.message}
          {...register(`shifts.${place}.runs`)}
        />
        <Select
          id={`${id}-measures`}
          label={t('crew.measures')}
          emptyLabel={t('crew.same')}
          options={toOptions(listRunners(shop.people))}
          error={wrong?.measures?.message}
          {...register(`shifts.${place}.measures`)}
        />
        <Select
          id={`${id}-calls`}
          label={t('crew.calls')}
          emptyLabel={t('crew.callsAsSaid')}
          options={toOptions(listCallees(shop.people))}
          error={wrong?.calls?.message}
          {...register(`shifts.${place}.calls`)}
        />
      </div>
      {mayWrite && (
        <div>
          <Button kind="quiet" icon="remove" onClick={onRemove}>
            {t('crew.remove')}
          </Button>
        </div>
      )}
    </QuestionPart>
  );
}
