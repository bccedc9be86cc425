import { useTranslation } from 'react-i18next';
import { Choice } from '../../../../components/ui/Choice.tsx';
import { TextInput } from '../../../../components/ui/TextInput.tsx';
import { partsFates } from '../../answer-choices.ts';
import { QuestionPart } from '../QuestionPart.tsx';
import { useAnswer } from '../use-answer.tsx';

/** What becomes of the trial's parts, and what to write on them. */
export function PartsPart() {
  const { t } = useTranslation('wizard-safety');
  const { content, set, errorAt, section } = useAnswer('parts');
  return (
    <QuestionPart title={t('safety.parts')}>
      <div className="grid grid-cols-[minmax(0,1fr)] gap-6" {...section}>
        <Choice
          id="fate"
          name="#/fate"
          legend={t('safety.parts')}
          legendHidden
          options={partsFates.map((fate) => ({ value: fate, label: t(`safety.fate.${fate}`) }))}
          value={content.fate ?? ''}
          onChange={({ target }) =>
            set({ ...content, fate: partsFates.find((fate) => fate === target.value) })
          }
          error={errorAt('#/fate')}
        />
        <TextInput
          id="parts-label"
          name="#/label"
          label={t('safety.label')}
          mark={t('safety.optional')}
          placeholder={t('safety.labelExample')}
          maxLength={200}
          autoComplete="off"
          value={content.label ?? ''}
          onChange={({ target }) => set({ ...content, label: target.value })}
          error={errorAt('#/label')}
        />
      </div>
    </QuestionPart>
  );
}
