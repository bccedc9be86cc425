import { useFormState, useWatch } from 'react-hook-form';
import { useTranslation } from 'react-i18next';
import { Checkbox } from '../../../components/ui/Checkbox.tsx';
import { Choice } from '../../../components/ui/Choice.tsx';
import { Disclosure } from '../../../components/ui/Disclosure.tsx';
import { NumberInput } from '../../../components/ui/NumberInput.tsx';
import type { SettingsForm } from './SettingCard.tsx';

interface Props {
  readonly form: SettingsForm;
  readonly place: number;
}

/** What most settings may leave as it is; the line that opens it says what holds now. */
export function SettingManners({ form, place }: Props) {
  const { t } = useTranslation('wizard');
  const { register, control } = form;
  const setting = useWatch({ control, name: `settings.${place}` });
  const { errors } = useFormState({ control, name: `settings.${place}` });
  if (!setting) return null;
  const wrong = errors.settings?.[place] as
    | { [Field in 'step' | 'min' | 'max' | 'settleMinutes' | 'discardParts' | 'hard']?: { message?: string } }
    | undefined;
  const { id, kind, settleMinutes, discardParts, hard } = setting;
  const figure = (field: 'step' | 'min' | 'max' | 'settleMinutes' | 'discardParts', unit?: string) => (
    <NumberInput
      id={`${id}-${field}`}
      label={t(`settings.${field}`)}
      unit={unit}
      error={wrong?.[field]?.message}
      {...register(`settings.${place}.${field}`)}
    />
  );
  const unit = kind === 'number' ? setting.unit : undefined;
  const summary = [
    ...(kind === 'number'
      ? [
          setting.step ? t('settings.sum.step', { step: setting.step }) : t('settings.sum.anyStep'),
          setting.min || setting.max ? t('settings.sum.limits') : t('settings.sum.noLimits'),
        ]
      : []),
    settleMinutes ? t('settings.sum.wait', { minutes: settleMinutes }) : t('settings.sum.noWait'),
    ...(discardParts ? [t('settings.sum.discard', { parts: discardParts })] : []),
    ...(hard ? [t('settings.sum.hard')] : []),
  ];

  return (
    <Disclosure summary={t('settings.more', { what: summary.join(', ') })}>
      <div className="grid grid-cols-[minmax(0,1fr)] gap-4">
        {kind === 'number' && (
          <div className="grid gap-4 sm:grid-cols-3">
            {figure('step', unit)}
            {figure('min', unit)}
            {figure('max', unit)}
          </div>
        )}
        <div className="grid gap-4 sm:grid-cols-2">
          {figure('settleMinutes', t('problem.minutesUnit'))}
          {figure('discardParts')}
        </div>
        <Checkbox
          id={`${id}-hard`}
          label={t('settings.hard')}
          help={t('settings.hardHelp')}
          error={wrong?.hard?.message}
          {...register(`settings.${place}.hard`)}
        />
        <Choice
          id={`${id}-harder`}
          legend={t('settings.harderEnd')}
          options={(['low', 'high', 'neither'] as const).map((end) => ({
            value: end,
            label:
              kind === 'choice' && end !== 'neither'
                ? setting[end] || (end === 'low' ? t('settings.first') : t('settings.second'))
                : t(`settings.ends.${end}`),
          }))}
          {...register(`settings.${place}.harderEnd`)}
        />
      </div>
    </Disclosure>
  );
}
