import { useWatch } from 'react-hook-form';
import { useTranslation } from 'react-i18next';
import { Checkbox } from '../../../components/ui/Checkbox.tsx';
import { Choice } from '../../../components/ui/Choice.tsx';
import { Disclosure } from '../../../components/ui/Disclosure.tsx';
import { NumberInput } from '../../../components/ui/NumberInput.tsx';
import { limitBearers } from '../answer-choices.ts';
import { QuestionPart } from './QuestionPart.tsx';
import { unitOfResult } from './result-unit.ts';
import { useQuestionForm } from './use-question-form.tsx';
import { useWizard } from './wizard-context.ts';

/** A limit that the result must meet, on the side that matters first. */
export function LimitPart() {
  const { t } = useTranslation('wizard');
  const { answers } = useWizard();
  const { register, control, formState } = useQuestionForm('limit');
  const { errors } = formState;
  const noLimit = useWatch({ control, name: 'noLimit' });
  const unit = unitOfResult(answers.result ?? {}, t);
  const wish = answers.result?.wish;
  const sides = wish === 'less' ? (['atMost', 'atLeast'] as const) : (['atLeast', 'atMost'] as const);
  return (
    <QuestionPart title={t('today.limit')}>
      {!noLimit && (
        <div className="grid gap-4 sm:grid-cols-2">
          {sides.map((side) => (
            <NumberInput
              key={side}
              id={`limit-${side}`}
              label={t(`today.${side}`)}
              unit={unit}
              error={errors[side]?.message}
              {...register(side)}
            />
          ))}
        </div>
      )}
      <Checkbox id="no-limit" label={t('today.noLimit')} {...register('noLimit')} />
      {!noLimit && (
        <Disclosure summary={t('today.limitMore')}>
          <Choice
            id="limit-for"
            legend={t('today.limitFor')}
            options={limitBearers.map((value) => ({ value, label: t(`today.limitBearers.${value}`) }))}
            {...register('limitFor')}
          />
        </Disclosure>
      )}
    </QuestionPart>
  );
}
