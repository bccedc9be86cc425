import { useFormState, useWatch } from 'react-hook-form';
import { useTranslation } from 'react-i18next';
import { Choice } from '../../../components/ui/Choice.tsx';
import { TextInput } from '../../../components/ui/TextInput.tsx';
import { settingEnds } from '../answer-choices.ts';
import type { SettingsForm } from './SettingCard.tsx';

interface Props {
  readonly form: SettingsForm;
  readonly place: number;
}

/** The two names of an A-or-B, and which one is used now. The words low and high never stand with it. */
export function ChoiceFields({ form, place }: Props) {
  const { t } = useTranslation('wizard');
  const { register, control } = form;
  const setting = useWatch({ control, name: `settings.${place}` });
  const { errors } = useFormState({ control, name: `settings.${place}` });
  if (setting?.kind !== 'choice') return null;
  const wrong = errors.settings?.[place];
  const { id } = setting;
  const labels = { low: t('settings.first'), high: t('settings.second') };
  return (
    <>
      <div className="grid gap-4 sm:grid-cols-2">
        {settingEnds.map((end) => (
          <TextInput
            key={end}
            id={`${id}-${end}`}
            label={labels[end]}
            autoComplete="off"
            error={wrong?.[end]?.message}
            {...register(`settings.${place}.${end}`)}
          />
        ))}
      </div>
      <Choice
        id={`${id}-usual`}
        legend={t('settings.usual')}
        options={settingEnds.map((end) => ({ value: end, label: setting[end] || labels[end] }))}
        error={wrong?.usual?.message}
        {...register(`settings.${place}.usual`)}
      />
    </>
  );
}
