import { useFormState, useWatch } from 'react-hook-form';
import { useTranslation } from 'react-i18next';
import { NumberInput } from '../../../components/ui/NumberInput.tsx';
import { SettingTrack } from '../../../components/ui/SettingTrack.tsx';
import { TextInput } from '../../../components/ui/TextInput.tsx';
import { parseFigure } from '../finished/typed-figure.ts';
import type { SettingsForm } from './SettingCard.tsx';

interface Props {
  readonly form: SettingsForm;
  readonly place: number;
}

function pointAt(typed: string | undefined, label = (text: string) => text) {
  const value = parseFigure(typed ?? '');
  return value === null ? undefined : { value, label: label((typed ?? '').trim()) };
}

/** Low, high, now and unit of a number, and where they lie on its track. */
export function NumberFields({ form, place }: Props) {
  const { t } = useTranslation('wizard');
  const { register, control } = form;
  const setting = useWatch({ control, name: `settings.${place}` });
  const { errors } = useFormState({ control, name: `settings.${place}` });
  if (setting?.kind !== 'number') return null;
  const found = errors.settings?.[place];
  const wrong = found as { [Field in 'low' | 'high' | 'usual' | 'unit']?: { message?: string } } | undefined;
  const { id, low, high, usual, min, max } = setting;
  const [lowPoint, highPoint] = [pointAt(low), pointAt(high)];
  const figures = ['low', 'high', 'usual'] as const;

  return (
    <>
      <div className="grid grid-cols-2 gap-4 sm:grid-cols-4">
        {figures.map((field) => (
          <NumberInput
            key={field}
            id={`${id}-${field}`}
            label={t(`settings.${field}`)}
            error={wrong?.[field]?.message}
            {...register(`settings.${place}.${field}`)}
          />
        ))}
        <TextInput
          id={`${id}-unit`}
          label={t('settings.unit')}
          autoComplete="off"
          error={wrong?.unit?.message}
          {...register(`settings.${place}.unit`)}
        />
      </div>
      {lowPoint && highPoint && lowPoint.value < highPoint.value && (
        <div>
          <SettingTrack
            low={lowPoint}
            high={highPoint}
            now={pointAt(usual, (now) => t('settings.trackNow', { now }))}
            min={pointAt(min)}
            max={pointAt(max)}
            label={t('settings.track', {
              name: setting.name ?? '',
              low: lowPoint.label,
              high: highPoint.label,
            })}
          />
          <p className="text-steel">{t('settings.wideEnough')}</p>
        </div>
      )}
    </>
  );
}
