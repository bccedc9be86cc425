import { type UseFormReturn, useWatch } from 'react-hook-form';
import { useTranslation } from 'react-i18next';
import { Button } from '../../../components/ui/Button.tsx';
import { Choice } from '../../../components/ui/Choice.tsx';
import { NumberInput } from '../../../components/ui/NumberInput.tsx';
import { Select } from '../../../components/ui/Select.tsx';
import { TextInput } from '../../../components/ui/TextInput.tsx';
import { resultKinds, wishes } from '../answer-choices.ts';
import type { AnswerOf } from '../answers.schema.ts';
import { unitOfResult } from './result-unit.ts';

interface Props {
  readonly form: UseFormReturn<AnswerOf<'watch'>>;
  readonly place: number;
  readonly onRemove: () => void;
}

/** One more result to keep an eye on: what it is, how one knows, and the limit it must keep. */
export function WatchedResult({ form, place, onRemove }: Props) {
  const { t } = useTranslation('wizard');
  const { register, control, formState } = form;
  const errors = formState.errors.results?.[place];
  const watched = useWatch({ control, name: `results.${place}` });
  const { kind, wish } = watched ?? {};
  const counts = kind === 'rejects' || kind === 'flaws';
  const unit = unitOfResult(watched ?? {}, t);
  const id = (field: string) => `watch-${place}-${field}`;
  const at = <Field extends string>(field: Field) => `results.${place}.${field}` as const;
  return (
    <fieldset className="grid grid-cols-[minmax(0,1fr)] gap-4">
      <legend className="sr-only">{t('today.watched', { number: place + 1 })}</legend>
      <TextInput
        id={id('name')}
        label={t('today.watchName')}
        placeholder={t('today.watchExample')}
        autoComplete="off"
        error={errors?.name?.message}
        {...register(at('name'))}
      />
      <Choice
        id={id('wish')}
        legend={t('problem.wish')}
        options={wishes.map((value) => ({ value, label: t(`problem.wishes.${value}`) }))}
        error={errors?.wish?.message}
        {...register(at('wish'))}
      />
      <div className="grid gap-4 sm:grid-cols-2">
        <Select
          id={id('kind')}
          label={t('problem.kind')}
          emptyLabel={t('today.pickOne')}
          options={resultKinds.map((value) => ({ value, label: t(`problem.kinds.${value}`) }))}
          error={errors?.kind?.message}
          {...register(at('kind'))}
        />
        {kind === 'measured' && (
          <TextInput
            id={id('unit')}
            label={t('problem.unit')}
            autoComplete="off"
            error={errors?.unit?.message}
            {...register(at('unit'))}
          />
        )}
        {counts && (
          <NumberInput
            id={id('lot')}
            label={kind === 'rejects' ? t('problem.lotSize') : t('problem.flawLot')}
            error={errors?.lotSize?.message}
            {...register(at('lotSize'))}
          />
        )}
        {wish === 'target' && (
          <NumberInput
            id={id('target')}
            label={t('problem.target')}
            unit={unit}
            error={errors?.target?.message}
            {...register(at('target'))}
          />
        )}
        <NumberInput
          id={id('usual')}
          label={t('today.usual')}
          unit={unit}
          error={errors?.usual?.message}
          {...register(at('usual'))}
        />
        {(['atLeast', 'atMost'] as const).map((side) => (
          <NumberInput
            key={side}
            id={id(side)}
            label={t(`today.watchLimit.${side}`)}
            unit={unit}
            error={errors?.[side]?.message}
            {...register(at(side))}
          />
        ))}
      </div>
      <div>
        <Button kind="quiet" icon="remove" onClick={onRemove}>
          {t('today.watchRemove')}
        </Button>
      </div>
    </fieldset>
  );
}
