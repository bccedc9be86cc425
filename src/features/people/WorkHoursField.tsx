import { type Control, useFieldArray, useFormState, useWatch } from 'react-hook-form';
import { useTranslation } from 'react-i18next';
import { Button } from '../../components/ui/Button.tsx';
import { Choice } from '../../components/ui/Choice.tsx';
import { TextInput } from '../../components/ui/TextInput.tsx';
import type { PersonFormValues } from './person-form.ts';
import { parseWallTime } from './work-hours.ts';

const days = ['1', '2', '3', '4', '5', '6', '7'] as const;

interface Props {
  readonly control: Control<PersonFormValues>;
}

/** When a person may be texted: one line of days and times for each shift they work. */
export function WorkHoursField({ control }: Props) {
  const { t } = useTranslation('people');
  const { fields, append, remove } = useFieldArray({ control, name: 'hours' });
  return (
    <fieldset className="field">
      <legend className="field-label">{t('form.hours')}</legend>
      <p className="field-help">{t('form.hoursHelp')}</p>
      <div className="grid gap-6">
        {fields.map((field, place) => (
          <WorkSpanFields key={field.id} control={control} place={place} onRemove={() => remove(place)} />
        ))}
      </div>
      <div className="mt-4">
        <Button
          icon="plus"
          onClick={() => append({ days: ['1', '2', '3', '4', '5'], from: '06:00', to: '14:00' })}
        >
          {t('form.addHours')}
        </Button>
      </div>
    </fieldset>
  );
}

/** Whether a shift ends on the day after it began. */
function isOvernight(from: string, to: string): boolean {
  const [start, end] = [parseWallTime(from), parseWallTime(to)];
  return start !== null && end !== null && end <= start;
}

function WorkSpanFields({
  control,
  place,
  onRemove,
}: Props & { readonly place: number; readonly onRemove: () => void }) {
  const { t } = useTranslation('people');
  const { errors } = useFormState({ control });
  const wrong = errors.hours?.[place];
  const name = `hours.${place}` as const;
  const { from, to } = useWatch({ control, name });
  const id = `hours-${place}`;
  return (
    <div className="grid gap-4 border-l-4 border-line pl-4">
      <Choice
        id={`${id}-days`}
        legend={t('form.days')}
        several
        options={days.map((day) => ({ value: day, label: t(`day.${day}`) }))}
        error={wrong?.days?.message}
        {...control.register(`${name}.days`)}
      />
      <div className="flex flex-wrap items-start gap-4">
        <TextInput
          id={`${id}-from`}
          inputMode="numeric"
          autoComplete="off"
          maxLength={5}
          label={t('form.from')}
          error={wrong?.from?.message}
          {...control.register(`${name}.from`)}
        />
        <TextInput
          id={`${id}-to`}
          inputMode="numeric"
          autoComplete="off"
          maxLength={5}
          label={t('form.to')}
          error={wrong?.to?.message}
          {...control.register(`${name}.to`)}
        />
        <Button kind="quiet" icon="remove" onClick={onRemove}>
          {t('form.removeHours')}
        </Button>
      </div>
      {isOvernight(from, to) && <p className="text-steel">{t('form.overnight')}</p>}
    </div>
  );
}
