import { memo } from 'react';
import { type UseFormReturn, useFormState, useWatch } from 'react-hook-form';
import { useTranslation } from 'react-i18next';
import { ActionMenu } from '../../../components/ui/ActionMenu.tsx';
import { Button } from '../../../components/ui/Button.tsx';
import { TextInput } from '../../../components/ui/TextInput.tsx';
import type { AnswerOf } from '../answers.schema.ts';
import { ChoiceFields } from './ChoiceFields.tsx';
import { CoachLines } from './CoachLines.tsx';
import { NumberFields } from './NumberFields.tsx';
import { SettingManners } from './SettingManners.tsx';
import { useForms } from './use-question-form.tsx';

export type SettingsForm = UseFormReturn<AnswerOf<'settings'>>;

interface Props {
  readonly form: SettingsForm;
  readonly place: number;
  /** Place of the last setting. */
  readonly last: number;
  readonly onRemove: (place: number) => void;
  readonly onMove: (from: number, to: number) => void;
}

/** One setting: its name here and on the panel, its two ends and today's value, and under More how it behaves. */
export const SettingCard = memo(function SettingCard({ form, place, last, onRemove, onMove }: Props) {
  const { t } = useTranslation('wizard');
  const { mayWrite } = useForms();
  const { register, control } = form;
  const setting = useWatch({ control, name: `settings.${place}` });
  const { errors } = useFormState({ control, name: `settings.${place}` });
  if (!setting) return null;
  const wrong = errors.settings?.[place];
  const { id, kind } = setting;
  const name = setting.name || t('settings.unnamed', { number: place + 1 });
  const moves = [
    { key: 'up', label: t('settings.moveUp'), icon: 'arrow-up' as const, to: place - 1 },
    { key: 'down', label: t('settings.moveDown'), icon: 'arrow-down' as const, to: place + 1 },
  ].filter(({ to }) => to >= 0 && to <= last);

  return (
    <section
      id={`setting-${id}`}
      tabIndex={-1}
      className="sheet grid grid-cols-[minmax(0,1fr)] gap-4"
      aria-labelledby={`setting-${id}-head`}
    >
      <div className="flex flex-wrap items-center justify-between gap-2">
        <h2 id={`setting-${id}-head`} className="min-w-0 break-words">
          {t('settings.head', { number: place + 1, name })}
        </h2>
        {mayWrite && (
          <div className="flex items-center">
            {moves.length > 0 && (
              <ActionMenu
                label={t('settings.move')}
                actions={moves.map(({ to, ...action }) => ({ ...action, onPick: () => onMove(place, to) }))}
              />
            )}
            <Button kind="quiet" icon="remove" onClick={() => onRemove(place)}>
              {t('settings.remove')}
              <span className="sr-only"> {name}</span>
            </Button>
          </div>
        )}
      </div>
      <div className="grid gap-4 sm:grid-cols-2">
        <TextInput
          id={`${id}-name`}
          label={t('settings.name')}
          autoComplete="off"
          error={wrong?.name?.message}
          {...register(`settings.${place}.name`)}
        />
        <TextInput
          id={`${id}-panel`}
          label={t('settings.panel')}
          autoComplete="off"
          placeholder={setting.name?.toUpperCase()}
          error={wrong?.panelName?.message}
          {...register(`settings.${place}.panelName`)}
        />
      </div>
      {kind === 'number' ? (
        <NumberFields form={form} place={place} />
      ) : (
        <ChoiceFields form={form} place={place} />
      )}
      <CoachLines
        of={{ letter: String.fromCharCode(65 + place) }}
        besides={wrong ? saidAtFields : undefined}
      />
      <SettingManners form={form} place={place} />
    </section>
  );
});

/** Remarks that stand at the field once it was left. */
const saidAtFields = ['low-not-below-high', 'end-beyond-machine', 'usual-outside-range'] as const;
