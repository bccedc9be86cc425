import { useTranslation } from 'react-i18next';
import { Callout } from '../../../components/ui/Callout.tsx';
import { Disclosure } from '../../../components/ui/Disclosure.tsx';
import { NumberInput } from '../../../components/ui/NumberInput.tsx';
import { formatsFor } from '../../../i18n/format.ts';
import type { Language } from '../../../i18n/languages.ts';
import type { GaugeCheck } from '../../../lib/doe/index.ts';
import { QuestionPart } from './QuestionPart.tsx';
import { unitOfResult } from './result-unit.ts';
import { useQuestionForm } from './use-question-form.tsx';
import { useWizard } from './wizard-context.ts';

const rows = [0, 1, 2, 3, 4] as const;

function GaugeWords({ check, unit }: { check: GaugeCheck; unit: string | undefined }) {
  const { t, i18n } = useTranslation('wizard');
  const { number } = formatsFor(i18n.language as Language, 'UTC');
  const size = `${number(Number(check.repeatsWithin.toPrecision(2)))} ${unit ?? ''}`.trim();
  const tone = { fine: 'good', coarse: 'caution', unclear: 'info' } as const;
  return (
    <Callout tone={tone[check.call]} live="polite">
      <p>{t('today.gaugeSize', { size })}</p>
      <p>{t(`today.gaugeCall.${check.call}`)}</p>
    </Callout>
  );
}

/** Five parts measured twice: how much of what is seen is the gauge's own. */
export function GaugePart() {
  const { t } = useTranslation('wizard');
  const { answers, soFar } = useWizard();
  const { register, formState } = useQuestionForm('gauge');
  const { kind } = answers.result ?? {};
  if (kind === 'rejects' || kind === 'flaws') return null;
  const { gauge } = soFar.today;
  const unit = unitOfResult(answers.result ?? {}, t);
  return (
    <QuestionPart>
      <Disclosure summary={t('today.gauge')} startsOpen={(answers.gauge?.pairs.length ?? 0) > 0}>
        <div className="grid grid-cols-[minmax(0,1fr)] gap-4">
          <p className="text-steel">{t('today.gaugeHelp')}</p>
          {rows.map((row) => (
            <div key={row} className="grid grid-cols-2 gap-4">
              {(['first', 'second'] as const).map((side) => (
                <NumberInput
                  key={side}
                  id={`gauge-${row}-${side}`}
                  label={t(`today.gaugeReading.${side}`, { part: row + 1 })}
                  error={formState.errors.pairs?.[row]?.[side]?.message}
                  {...register(`pairs.${row}.${side}`)}
                />
              ))}
            </div>
          ))}
          {gauge && <GaugeWords check={gauge} unit={unit} />}
        </div>
      </Disclosure>
    </QuestionPart>
  );
}
