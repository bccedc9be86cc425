import { useWatch } from 'react-hook-form';
import { useTranslation } from 'react-i18next';
import { Choice } from '../../../components/ui/Choice.tsx';
import { Disclosure } from '../../../components/ui/Disclosure.tsx';
import { NumberInput } from '../../../components/ui/NumberInput.tsx';
import { TextInput } from '../../../components/ui/TextInput.tsx';
import { measuringTimes } from '../answer-choices.ts';
import { CoachLines } from './CoachLines.tsx';
import { QuestionPart } from './QuestionPart.tsx';
import { useQuestionForm } from './use-question-form.tsx';
import { useWizard } from './wizard-context.ts';

/** Who measures, when the number is there, and how many parts stand behind it. */
export function MeasuringPart() {
  const { t } = useTranslation('wizard');
  const { answers } = useWizard();
  const { register, control, formState } = useQuestionForm('measuring');
  const { errors } = formState;
  const [who, when] = useWatch({ control, name: ['who', 'when'] });
  const kind = answers.result?.kind;
  const counts = kind === 'rejects' || kind === 'flaws';

  return (
    <QuestionPart>
      <Choice
        id="who"
        legend={t('problem.who')}
        options={(['operator', 'other'] as const).map((value) => ({
          value,
          label: t(`problem.whos.${value}`),
        }))}
        error={errors.who?.message}
        {...register('who')}
      />
      {who === 'other' && (
        <TextInput
          id="who-name"
          label={t('problem.whoName')}
          autoComplete="off"
          error={errors.whoName?.message}
          {...register('whoName')}
        />
      )}
      <Choice
        id="when"
        legend={t('problem.when')}
        options={measuringTimes.map((value) => ({ value, label: t(`problem.whens.${value}`) }))}
        error={errors.when?.message}
        {...register('when')}
      />
      {when === 'minutes' && (
        <NumberInput
          id="minutes"
          label={t('problem.minutes')}
          unit={t('problem.minutesUnit')}
          error={errors.minutes?.message}
          {...register('minutes')}
        />
      )}
      {!counts && (
        <NumberInput
          id="parts-per-run"
          label={t('problem.parts')}
          help={t('problem.partsHelp')}
          error={errors.partsPerRun?.message}
          {...register('partsPerRun')}
        />
      )}
      <CoachLines of="parts" />
      {kind === 'measured' && (
        <Disclosure summary={t('problem.more')}>
          <NumberInput
            id="gauge-step"
            label={t('problem.gaugeStep')}
            help={t('problem.gaugeStepHelp')}
            unit={answers.result?.unit}
            error={errors.gaugeStep?.message}
            {...register('gaugeStep')}
          />
        </Disclosure>
      )}
    </QuestionPart>
  );
}
