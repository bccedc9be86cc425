import { useTranslation } from 'react-i18next';
import { Choice } from '../../../../components/ui/Choice.tsx';
import { JobTag } from '../../../../components/ui/JobTag.tsx';
import { formatsFor } from '../../../../i18n/format.ts';
import type { Language } from '../../../../i18n/languages.ts';
import { lookDecisions } from '../../answer-choices.ts';
import type { HardMix, PublicPlan } from '../../plan.schema.ts';
import { tagSettingsOf } from '../tag-settings.tsx';
import { useWizard } from '../wizard-context.ts';
import type { LookedMix } from './look-mixes.ts';

interface Props {
  readonly mix: HardMix;
  readonly plan: PublicPlan;
  readonly decision: LookedMix['decision'];
  readonly isChecked: boolean;
  /** While the plan is made again nothing else can be decided. */
  readonly isBusy: boolean;
  readonly onDecide: (decision: LookedMix['decision']) => void;
}

const settingsOnTag = 5;

/** One of the hardest runs as the tag that will hang on the machine, and what is said to it. Nobody ticks "safe". */
export function HardRun({ mix, plan, decision, isChecked, isBusy, onDecide }: Props) {
  const { t, i18n } = useTranslation('wizard-safety');
  const { t: tErrors } = useTranslation('errors');
  const { answers, shop } = useWizard();
  const formats = formatsFor(i18n.language as Language, shop.timeZone);
  const settings = tagSettingsOf(plan, mix.order, answers.settings?.settings ?? [], formats);
  const number = String(mix.order);
  const more = settings.length - settingsOnTag;
  return (
    <li className="hard-run">
      <JobTag
        number={number}
        name={t('start.run', { number })}
        state="planned"
        stateWord={t('start.planned')}
        settings={settings}
        moreLabel={more > 0 ? t('start.andMore', { count: more }) : undefined}
      />
      <Choice
        id={`look-${number}`}
        name={`look-${number}`}
        legend={t('start.decide', { number })}
        options={lookDecisions.map((value) => ({
          value,
          label: t(`start.decision.${value}`),
          disabled: isBusy,
        }))}
        value={decision ?? ''}
        onChange={({ target }) => onDecide(lookDecisions.find((each) => each === target.value))}
        error={isChecked && decision === undefined ? tErrors('field.decide-mix') : undefined}
      />
    </li>
  );
}
