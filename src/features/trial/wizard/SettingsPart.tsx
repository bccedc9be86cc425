import { useCallback, useEffect, useState } from 'react';
import { useFieldArray } from 'react-hook-form';
import { useTranslation } from 'react-i18next';
import { Button } from '../../../components/ui/Button.tsx';
import { Callout } from '../../../components/ui/Callout.tsx';
import { EmptyState } from '../../../components/ui/EmptyState.tsx';
import { FieldError } from '../../../components/ui/FieldError.tsx';
import type { SettingAnswer } from '../answers.schema.ts';
import { CoachLines } from './CoachLines.tsx';
import { PasteSettings } from './PasteSettings.tsx';
import { SettingCard } from './SettingCard.tsx';
import { useForms, useQuestionForm } from './use-question-form.tsx';

const mostSettings = 7;

interface Removed {
  setting: SettingAnswer;
  place: number;
}

/** One to seven settings as cards in the order of the shop; each can be moved, taken away, and brought back. */
export function SettingsPart() {
  const { t } = useTranslation('wizard');
  const { mayWrite } = useForms();
  const form = useQuestionForm('settings');
  const { control, getValues, formState } = form;
  // The form's own key must not take the place of the setting's id.
  const { fields, append, remove, insert, move } = useFieldArray({
    control,
    name: 'settings',
    keyName: 'key',
  });
  const [removed, setRemoved] = useState<Removed | null>(null);
  const [moved, setMoved] = useState<{ id: string; words: string } | null>(null);

  useEffect(() => {
    if (moved) document.getElementById(`setting-${moved.id}`)?.focus();
  }, [moved]);

  function add(kind: 'number' | 'choice'): void {
    const id = crypto.randomUUID();
    append({ kind, id } as SettingAnswer, { focusName: `settings.${fields.length}.name` });
    setRemoved(null);
  }
  const takeAway = useCallback(
    (place: number): void => {
      setRemoved({ setting: getValues(`settings.${place}`), place });
      remove(place);
    },
    [getValues, remove],
  );
  const moveTo = useCallback(
    (from: number, to: number): void => {
      const { id, name = '' } = getValues(`settings.${from}`);
      const count = getValues('settings').length;
      setMoved({ id, words: t('settings.moved', { name, place: to + 1, count }) });
      move(from, to);
    },
    [getValues, move, t],
  );
  function bringBack({ setting, place }: Removed): void {
    insert(Math.min(place, fields.length), setting, { focusName: `settings.${place}.name` });
    setRemoved(null);
  }
  const isFull = fields.length >= mostSettings;
  return (
    <div className="grid grid-cols-[minmax(0,1fr)] gap-4">
      {fields.length === 0 && <EmptyState title={t('settings.none')}>{t('settings.noneWords')}</EmptyState>}
      {fields.map((field, place) => (
        <SettingCard
          key={field.key}
          form={form}
          place={place}
          last={fields.length - 1}
          onRemove={takeAway}
          onMove={moveTo}
        />
      ))}
      <p role="status" className="sr-only">
        {moved?.words}
      </p>
      {removed && (
        <Callout
          tone="info"
          live="polite"
          actions={<Button onClick={() => bringBack(removed)}>{t('settings.undo')}</Button>}
        >
          {t('settings.removed', {
            name: removed.setting.name || t('settings.unnamed', { number: removed.place + 1 }),
          })}
        </Callout>
      )}
      <FieldError id="settings">
        {formState.isSubmitted || fields.length === 0 ? formState.errors.settings?.message : undefined}
      </FieldError>
      <CoachLines of="settings" />
      {mayWrite && (
        <>
          <div className="button-row">
            <Button id="add-number" icon="plus" disabled={isFull} onClick={() => add('number')}>
              {t('settings.addNumber')}
            </Button>
            <Button icon="plus" disabled={isFull} onClick={() => add('choice')}>
              {t('settings.addChoice')}
            </Button>
          </div>
          {isFull ? (
            <p className="text-steel">{t('settings.full')}</p>
          ) : (
            <PasteSettings room={mostSettings - fields.length} onAdd={(settings) => append(settings)} />
          )}
        </>
      )}
    </div>
  );
}
