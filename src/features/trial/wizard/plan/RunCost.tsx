import { useWatch } from 'react-hook-form';
import { useTranslation } from 'react-i18next';
import { Disclosure } from '../../../../components/ui/Disclosure.tsx';
import { NumberInput } from '../../../../components/ui/NumberInput.tsx';
import { formatsFor } from '../../../../i18n/format.ts';
import type { Language } from '../../../../i18n/languages.ts';
import { usualMinutesPerRun } from '../../brief/minutes-per-run.ts';
import { parseFigure } from '../../finished/typed-figure.ts';
import { contentOf, finishedSchemas } from '../../finished.schema.ts';
import { useWizard } from '../wizard-context.ts';
import type { SpareForm } from './use-spare.tsx';

/** What one run takes in time and money; what holds where nothing is typed stands in the words. */
export function RunCost({ form }: { readonly form: SpareForm }) {
  const { t, i18n } = useTranslation('wizard-plan');
  const { answers, shop } = useWizard();
  const { number } = formatsFor(i18n.language as Language, 'UTC');
  const spare = useWatch({ control: form.control });
  const { errors } = form.formState;
  const measuring = finishedSchemas.measuring.safeParse(contentOf(answers, 'measuring'));
  const usual = usualMinutesPerRun(measuring.success ? measuring.data : { when: 'atOnce', minutes: null });
  const minutes = number(parseFigure(spare.minutesPerRun ?? '') ?? usual);
  const cost = spare.costPerRun?.trim();
  const summary = cost
    ? t('plan.runTakesAndCosts', { minutes, cost: `${cost} ${shop.currency}` })
    : t('plan.runTakes', { minutes });
  return (
    <Disclosure summary={summary}>
      <div className="grid gap-4 sm:grid-cols-2">
        <NumberInput
          id="minutes-per-run"
          label={t('plan.minutesPerRun')}
          help={t('plan.minutesPerRunHelp', { number: number(usual) })}
          unit={t('plan.minutesUnit')}
          error={errors.minutesPerRun?.message}
          {...form.register('minutesPerRun')}
        />
        <NumberInput
          id="cost-per-run"
          label={t('plan.costPerRun')}
          help={t('plan.costPerRunHelp')}
          unit={shop.currency}
          error={errors.costPerRun?.message}
          {...form.register('costPerRun')}
        />
      </div>
    </Disclosure>
  );
}
