import { useWatch } from 'react-hook-form';
import { useTranslation } from 'react-i18next';
import { Slider } from '../../../../components/ui/Slider.tsx';
import { formatsFor } from '../../../../i18n/format.ts';
import type { Language } from '../../../../i18n/languages.ts';
import { planDefaults } from '../../finished/start.schema.ts';
import { parseFigure } from '../../finished/typed-figure.ts';
import { aboutMoney } from '../so-far-words.ts';
import { useWizard } from '../wizard-context.ts';
import { hourStops, limitOf, moneyStops, placeOf, runRange } from './spare-stops.ts';
import { relaxTo, type SpareForm } from './use-spare.tsx';

/** Runs, hours and money that one can spare. Each move deals the plans anew. */
export function SpareSliders({ form }: { readonly form: SpareForm }) {
  const { t, i18n } = useTranslation('wizard-plan');
  const { shop } = useWizard();
  const language = i18n.language as Language;
  const { number } = formatsFor(language, 'UTC');
  const spare = useWatch({ control: form.control });
  const runs = parseFigure(spare.runs ?? '') ?? planDefaults.maxRuns;
  const hours = limitOf(spare.hours, spare.hoursOpen);
  const cost = parseFigure(spare.costPerRun ?? '');
  const money = limitOf(spare.money, spare.moneyOpen);
  const stops = cost !== null && cost > 0 ? moneyStops(cost) : [];
  const hourWords = hours === null ? t('plan.noLimit') : t('plan.upToHours', { number: number(hours) });
  const moneyWords =
    money === null
      ? t('plan.noLimit')
      : t('plan.upToMoney', { money: aboutMoney(money, shop.currency, language) });

  return (
    <div className="grid gap-5">
      <Slider
        id="spare-runs"
        label={t('plan.runs')}
        min={runRange.least}
        max={runRange.most}
        step={1}
        value={runs}
        valueWords={t('plan.upToRuns', { count: runs })}
        onChange={(event) => relaxTo(form, 'runs', Number(event.currentTarget.value))}
      />
      <Slider
        id="spare-hours"
        label={t('plan.hours')}
        min={0}
        max={hourStops.length}
        step={1}
        value={placeOf(hours, hourStops)}
        valueWords={hourWords}
        onChange={(event) => relaxTo(form, 'hours', hourStops[Number(event.currentTarget.value)] ?? null)}
      />
      {stops.length > 0 && (
        <Slider
          id="spare-money"
          label={t('plan.money')}
          min={0}
          max={stops.length}
          step={1}
          value={placeOf(money, stops)}
          valueWords={moneyWords}
          onChange={(event) => relaxTo(form, 'money', stops[Number(event.currentTarget.value)] ?? null)}
        />
      )}
    </div>
  );
}
