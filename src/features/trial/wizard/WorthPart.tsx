import { useWatch } from 'react-hook-form';
import { useTranslation } from 'react-i18next';
import { Button } from '../../../components/ui/Button.tsx';
import { NumberInput } from '../../../components/ui/NumberInput.tsx';
import { formatsFor } from '../../../i18n/format.ts';
import type { Language } from '../../../i18n/languages.ts';
import { CoachLines } from './CoachLines.tsx';
import { QuestionPart } from './QuestionPart.tsx';
import { unitOfResult } from './result-unit.ts';
import { useQuestionForm } from './use-question-form.tsx';
import { useWizard } from './wizard-context.ts';

/** The smallest difference worth having: the one number that nobody else can know. */
export function WorthPart() {
  const { t, i18n } = useTranslation('wizard');
  const { answers, soFar, mayWrite } = useWizard();
  const { register, control, setValue, formState } = useQuestionForm('worth');
  const change = useWatch({ control, name: 'change' });
  const { number } = formatsFor(i18n.language as Language, 'UTC');
  const { suggestions } = soFar.today;
  return (
    <QuestionPart>
      <div className="grid gap-3">
        <NumberInput
          id="worth"
          label={t('today.worth')}
          unit={unitOfResult(answers.result ?? {}, t)}
          error={formState.errors.change?.message}
          {...register('change')}
        />
        {suggestions.length > 0 && mayWrite && (
          <fieldset className="button-row items-center">
            <legend className="sr-only">{t('today.worthSuggested')}</legend>
            {suggestions.map((size) => (
              <Button
                key={size}
                aria-pressed={change === number(size)}
                onClick={() =>
                  setValue('change', number(size), {
                    shouldDirty: true,
                    shouldTouch: true,
                    shouldValidate: true,
                  })
                }
              >
                {number(size)}
              </Button>
            ))}
          </fieldset>
        )}
        <p className="text-steel">{t('today.worthHelp')}</p>
      </div>
      <CoachLines of="worth" />
    </QuestionPart>
  );
}
