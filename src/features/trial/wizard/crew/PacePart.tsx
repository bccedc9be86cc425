import { useWatch } from 'react-hook-form';
import { useTranslation } from 'react-i18next';
import { Choice } from '../../../../components/ui/Choice.tsx';
import { Disclosure } from '../../../../components/ui/Disclosure.tsx';
import { NumberInput } from '../../../../components/ui/NumberInput.tsx';
import { TextInput } from '../../../../components/ui/TextInput.tsx';
import { paces } from '../../answer-choices.ts';
import { planDefaults } from '../../finished/start.schema.ts';
import { QuestionPart } from '../QuestionPart.tsx';
import { useQuestionForm } from '../use-question-form.tsx';

/** When it starts, when the next run goes out, and how often somebody is reminded. */
export function PacePart() {
  const { t } = useTranslation('wizard-plan');
  const form = useQuestionForm('pace');
  const { register, control, formState } = form;
  const { errors } = formState;
  const { next, remindMinutes, remindTimes } = useWatch({ control });
  const minutes = remindMinutes?.trim() || String(planDefaults.remindMinutes);
  const times = remindTimes?.trim() || String(planDefaults.remindTimes);
  return (
    <QuestionPart title={t('pace.title')} help={t('pace.help')}>
      <div className="grid gap-4 sm:grid-cols-2">
        <TextInput
          id="start-date"
          type="date"
          label={t('pace.date')}
          error={errors.startDate?.message}
          {...register('startDate')}
        />
        <TextInput
          id="start-time"
          type="time"
          label={t('pace.time')}
          error={errors.startTime?.message}
          {...register('startTime')}
        />
      </div>
      <Choice
        id="next"
        legend={t('pace.next')}
        help={t('pace.nextHelp')}
        options={paces.map((value) => ({ value, label: t(`pace.nexts.${value}`) }))}
        {...register('next')}
      />
      {next === 'every' && (
        <div className="max-w-56">
          <NumberInput
            id="every-minutes"
            label={t('pace.everyMinutes')}
            unit={t('plan.minutesUnit')}
            error={errors.everyMinutes?.message}
            {...register('everyMinutes')}
          />
        </div>
      )}
      <Disclosure summary={t('pace.remind', { minutes, times })}>
        <div className="grid gap-4 sm:grid-cols-2">
          <NumberInput
            id="remind-minutes"
            label={t('pace.remindMinutes')}
            unit={t('plan.minutesUnit')}
            error={errors.remindMinutes?.message}
            {...register('remindMinutes')}
          />
          <NumberInput
            id="remind-times"
            label={t('pace.remindTimes')}
            help={t('pace.remindTimesHelp')}
            error={errors.remindTimes?.message}
            {...register('remindTimes')}
          />
        </div>
      </Disclosure>
    </QuestionPart>
  );
}
