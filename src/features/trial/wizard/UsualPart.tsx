import { useWatch } from 'react-hook-form';
import { useTranslation } from 'react-i18next';
import { Callout } from '../../../components/ui/Callout.tsx';
import { Checkbox } from '../../../components/ui/Checkbox.tsx';
import { NumberInput } from '../../../components/ui/NumberInput.tsx';
import { formatsFor } from '../../../i18n/format.ts';
import type { Language } from '../../../i18n/languages.ts';
import { parseFigure, parseFigures } from '../finished/typed-figure.ts';
import { DotStrip } from './DotStrip.tsx';
import { PastNumbers } from './PastNumbers.tsx';
import { QuestionPart } from './QuestionPart.tsx';
import { unitOfResult } from './result-unit.ts';
import { useQuestionForm } from './use-question-form.tsx';
import { useWizard } from './wizard-context.ts';

/** A normal day: the usual figure, the lowest and the highest, or past numbers. */
export function UsualPart() {
  const { t, i18n } = useTranslation('wizard');
  const { answers, soFar } = useWizard();
  const form = useQuestionForm('usual');
  const { register, control, formState } = form;
  const { errors } = formState;
  const [usual, lowest, highest, notSure, past] = useWatch({
    control,
    name: ['usual', 'lowest', 'highest', 'notSure', 'past'],
  });
  const unit = unitOfResult(answers.result ?? {}, t);
  const { number } = formatsFor(i18n.language as Language, 'UTC');
  const { swing } = soFar.today;
  const typed = [lowest, usual, highest].map((text) => parseFigure(text ?? ''));
  const dots = parseFigures(past ?? '') ?? [];
  const shown = dots.length > 0 ? dots : typed.filter((figure) => figure !== null);

  return (
    <QuestionPart>
      <NumberInput
        id="usual"
        label={t('today.usual')}
        unit={unit}
        error={errors.usual?.message}
        {...register('usual')}
      />
      <div className="grid gap-4 sm:grid-cols-2">
        <NumberInput
          id="lowest"
          label={t('today.lowest')}
          unit={unit}
          error={errors.lowest?.message}
          {...register('lowest')}
        />
        <NumberInput
          id="highest"
          label={t('today.highest')}
          unit={unit}
          error={errors.highest?.message}
          {...register('highest')}
        />
      </div>
      <Checkbox id="not-sure" label={t('today.notSure')} {...register('notSure')} />
      {notSure && <Callout tone="info">{t('today.notSureWords')}</Callout>}
      <PastNumbers form={form} unit={unit} />
      {shown.length > 1 && !notSure && (
        <div className="grid gap-1">
          <DotStrip
            figures={shown}
            write={number}
            label={t('today.strip', {
              count: shown.length,
              low: number(Math.min(...shown)),
              high: number(Math.max(...shown)),
            })}
          />
          {swing !== null && (
            <p>
              {t('today.swing', { size: `${number(Number(swing.toPrecision(2)))} ${unit ?? ''}`.trim() })}
            </p>
          )}
        </div>
      )}
    </QuestionPart>
  );
}
