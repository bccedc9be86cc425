import { useTranslation } from 'react-i18next';
import { Disclosure } from '../../../components/ui/Disclosure.tsx';
import { NumberInput } from '../../../components/ui/NumberInput.tsx';
import { QuestionPart } from './QuestionPart.tsx';
import { useQuestionForm } from './use-question-form.tsx';
import { useWizard } from './wizard-context.ts';

/** What a better result is worth, for whoever pays for the trial. */
export function ValuePart() {
  const { t } = useTranslation('wizard');
  const { shop, answers } = useWizard();
  const { register, formState } = useQuestionForm('value');
  const { errors } = formState;
  const isSaid = Object.keys(answers.value ?? {}).length > 0;
  return (
    <QuestionPart>
      <Disclosure summary={t('today.value')} startsOpen={isSaid}>
        <div className="grid gap-4 sm:grid-cols-2">
          <NumberInput
            id="parts-per-week"
            label={t('today.partsPerWeek')}
            error={errors.partsPerWeek?.message}
            {...register('partsPerWeek')}
          />
          <NumberInput
            id="cost-of-bad-part"
            label={t('today.costOfBadPart')}
            unit={shop.currency}
            error={errors.costOfBadPart?.message}
            {...register('costOfBadPart')}
          />
        </div>
      </Disclosure>
    </QuestionPart>
  );
}
