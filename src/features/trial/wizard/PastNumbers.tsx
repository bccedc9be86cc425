import { type ChangeEvent, useState } from 'react';
import type { UseFormReturn } from 'react-hook-form';
import { useTranslation } from 'react-i18next';
import { Disclosure } from '../../../components/ui/Disclosure.tsx';
import { FieldError } from '../../../components/ui/FieldError.tsx';
import { TextArea } from '../../../components/ui/TextArea.tsx';
import type { AnswerOf } from '../answers.schema.ts';
import { readFigureColumns } from './read-figure-columns.ts';

interface Props {
  readonly form: UseFormReturn<AnswerOf<'usual'>>;
  readonly unit: string | undefined;
}

/** More characters than a question keeps would be cut. */
const mostCharacters = 2_000;

/** Past numbers: typed, pasted from a spreadsheet, or out of a CSV file; they outweigh a guess. */
export function PastNumbers({ form, unit }: Props) {
  const { t } = useTranslation('wizard');
  const [fault, setFault] = useState<'none' | 'no numbers' | 'unreadable'>('none');
  const { register, setValue, formState } = form;

  async function load(event: ChangeEvent<HTMLInputElement>): Promise<void> {
    const file = event.currentTarget.files?.[0];
    event.currentTarget.value = '';
    if (!file) return;
    try {
      const figures = await readFigureColumns(file);
      // The newest stand last and say most of today.
      let kept = figures;
      while (kept.join('\n').length > mostCharacters) kept = kept.slice(1);
      setFault(kept.length === 0 ? 'no numbers' : 'none');
      if (kept.length > 0) {
        setValue('past', kept.join('\n'), { shouldDirty: true, shouldTouch: true, shouldValidate: true });
      }
    } catch {
      setFault('unreadable');
    }
  }

  const faults = { 'no numbers': t('today.pastNoNumbers'), unreadable: t('today.pastUnreadable') };
  return (
    <Disclosure summary={t('today.pastSummary')} startsOpen={Boolean(form.getValues('past'))}>
      <div className="grid gap-4">
        <TextArea
          id="past"
          label={unit ? t('today.pastIn', { unit }) : t('today.past')}
          help={t('today.pastHelp')}
          rows={4}
          inputMode="decimal"
          error={formState.errors.past?.message}
          {...register('past')}
        />
        <div className="field">
          <label htmlFor="past-file" className="field-label">
            {t('today.pastFile')}
          </label>
          <input
            id="past-file"
            type="file"
            accept=".csv,.txt,.tsv,text/csv,text/plain"
            className="input"
            aria-describedby={fault === 'none' ? undefined : 'past-file-error'}
            onChange={load}
          />
          <FieldError id="past-file">{fault === 'none' ? null : faults[fault]}</FieldError>
        </div>
      </div>
    </Disclosure>
  );
}
