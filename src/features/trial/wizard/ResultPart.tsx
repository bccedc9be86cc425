import { useWatch } from 'react-hook-form';
import { useTranslation } from 'react-i18next';
import { Callout } from '../../../components/ui/Callout.tsx';
import { Choice } from '../../../components/ui/Choice.tsx';
import { NumberInput } from '../../../components/ui/NumberInput.tsx';
import { TextInput } from '../../../components/ui/TextInput.tsx';
import { resultKinds, wishes } from '../answer-choices.ts';
import { BlankSentence } from './BlankSentence.tsx';
import { QuestionPart } from './QuestionPart.tsx';
import { useQuestionForm } from './use-question-form.tsx';

const marks = { machine: '<1>', result: '<2>' } as const;

/** The machine and the result in one sentence, which way is better, and how one knows. */
export function ResultPart() {
  const { t } = useTranslation('wizard');
  const job = useQuestionForm('job');
  const result = useQuestionForm('result');
  const { register, control, formState } = result;
  const { errors } = formState;
  const [kind, wish, unit] = useWatch({ control, name: ['kind', 'wish', 'unit'] });
  const counts = kind === 'rejects' || kind === 'flaws';

  return (
    <QuestionPart>
      <BlankSentence
        sentence={t('problem.sentence', marks)}
        blanks={[
          {
            mark: marks.machine,
            id: 'machine',
            label: t('problem.machine'),
            placeholder: t('problem.machineExample'),
            error: job.formState.errors.machine?.message,
            ...job.register('machine'),
          },
          {
            mark: marks.result,
            id: 'result-name',
            label: t('problem.result'),
            placeholder: t('problem.resultExample'),
            error: errors.name?.message,
            ...register('name'),
          },
        ]}
      />
      <Choice
        id="wish"
        legend={t('problem.wish')}
        options={wishes.map((value) => ({ value, label: t(`problem.wishes.${value}`) }))}
        error={errors.wish?.message}
        {...register('wish')}
      />
      {wish === 'target' && (
        <NumberInput
          id="target"
          label={t('problem.target')}
          unit={kind === 'measured' ? unit : undefined}
          error={errors.target?.message}
          {...register('target')}
        />
      )}
      <Choice
        id="kind"
        legend={t('problem.kind')}
        shape="cards"
        options={resultKinds.map((value) => ({
          value,
          label: t(`problem.kinds.${value}`),
          help: t(`problem.kindHelp.${value}`),
        }))}
        error={errors.kind?.message}
        {...register('kind')}
      />
      {kind === 'measured' && (
        <TextInput
          id="unit"
          label={t('problem.unit')}
          help={t('problem.unitHelp')}
          autoComplete="off"
          error={errors.unit?.message}
          {...register('unit')}
        />
      )}
      {kind === 'scored' && <Callout tone="info">{t('problem.scoreBlind')}</Callout>}
      {counts && (
        <NumberInput
          id="lot-size"
          label={kind === 'rejects' ? t('problem.lotSize') : t('problem.flawLot')}
          error={errors.lotSize?.message}
          {...register('lotSize')}
        />
      )}
      {kind === 'rejects' && <Callout tone="caution">{t('problem.countingWords')}</Callout>}
    </QuestionPart>
  );
}
