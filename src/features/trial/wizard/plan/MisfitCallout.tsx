import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Button } from '../../../../components/ui/Button.tsx';
import { ButtonLink } from '../../../../components/ui/ButtonLink.tsx';
import { Callout } from '../../../../components/ui/Callout.tsx';
import { formatsFor } from '../../../../i18n/format.ts';
import type { Language } from '../../../../i18n/languages.ts';
import type { WizardStep } from '../../questions.ts';
import { aboutMoney, aboutTime } from '../so-far-words.ts';
import { type SoFar, useWizard } from '../wizard-context.ts';
import { addressOf } from '../wizard-page.ts';
import { hourStops, runRange } from './spare-stops.ts';
import { relaxTo, type SpareForm } from './use-spare.tsx';

interface Props {
  readonly misfit: NonNullable<SoFar['misfit']>;
  readonly form: SpareForm;
}

/** Why no plan fits, and the buttons that make one fit. */
export function MisfitCallout({ misfit, form }: Props) {
  const { t, i18n } = useTranslation('wizard-plan');
  const { t: tFrame } = useTranslation('wizard-frame');
  const { soFar, shop, trialId, mayWrite } = useWizard();
  const language = i18n.language as Language;
  const { number } = formatsFor(language, 'UTC');
  const need = typeof misfit.need === 'number' ? misfit.need : 0;
  const brief = soFar.brief;
  const settings = brief?.factors.length ?? 0;

  const link = (step: WizardStep, label: string) => (
    <ButtonLink href={addressOf(trialId, step)}>{label}</ButtonLink>
  );
  const dropSetting = settings > 1 && link('settings', t('plan.misfit.dropSetting'));
  const relax = (limit: 'runs' | 'hours' | 'money', amount: number | null, label: string) =>
    mayWrite && <Button onClick={() => relaxTo(form, limit, amount)}>{label}</Button>;

  function say(): { words: string; actions: ReactNode } {
    switch (misfit.code) {
      case 'too-few-runs': {
        const runs = brief?.budget.maxRuns ?? 0;
        const words = t('plan.misfit.runs', { count: settings, runs: number(runs), need: number(need) });
        const allow =
          need <= runRange.most && relax('runs', need, t('plan.misfit.allowRuns', { count: need }));
        return {
          words,
          actions: (
            <>
              {allow}
              {dropSetting}
            </>
          ),
        };
      }
      case 'too-little-time': {
        const words = t('plan.misfit.time', { time: aboutTime(need, tFrame, language) });
        const hours = hourStops.find((stop) => stop * 60 >= need) ?? null;
        const label =
          hours === null
            ? t('plan.misfit.openHours')
            : t('plan.misfit.allowHours', { number: number(hours) });
        return {
          words,
          actions: (
            <>
              {relax('hours', hours, label)}
              {dropSetting}
            </>
          ),
        };
      }
      case 'too-little-money': {
        const money = aboutMoney(need, shop.currency, language);
        const allow = relax('money', need, t('plan.misfit.allowMoney', { money }));
        return {
          words: t('plan.misfit.money', { money }),
          actions: (
            <>
              {allow}
              {dropSetting}
            </>
          ),
        };
      }
      case 'blocks-too-small':
      case 'too-many-blocks':
        return { words: t('plan.misfit.split'), actions: link('around', t('plan.misfit.changeSplit')) };
      case 'too-much-forbidden':
      case 'everything-forbidden':
        return { words: t('plan.misfit.rules'), actions: link('safety', t('plan.misfit.lookAtRules')) };
      default:
        return { words: t('plan.misfit.other'), actions: link('settings', t('plan.misfit.lookAtSettings')) };
    }
  }
  const { words, actions } = say();
  return (
    <Callout tone="caution" title={t('plan.misfit.title')} live="polite" actions={actions}>
      {words}
    </Callout>
  );
}
