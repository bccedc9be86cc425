import { useTranslation } from 'react-i18next';
import { Button } from '../../../../components/ui/Button.tsx';
import { Callout } from '../../../../components/ui/Callout.tsx';
import { formatsFor } from '../../../../i18n/format.ts';
import type { Language } from '../../../../i18n/languages.ts';
import type { HardMix } from '../../plan.schema.ts';
import { decisionOn } from '../../readiness.ts';
import { QuestionPart } from '../QuestionPart.tsx';
import { mixParts } from '../setting-words.ts';
import { useAnswer } from '../use-answer.tsx';
import { useWizard } from '../wizard-context.ts';
import { HardRun } from './HardRun.tsx';
import { decideMix, type LookedMix, mixKey, ruledOutMixes } from './look-mixes.ts';
import { useStanding } from './standing.tsx';
import { type Remake, useRemake } from './use-remake.tsx';

interface Props {
  /** Whether a start was tried, so that runs nobody has decided on are named. */
  readonly isChecked: boolean;
}

const noHardest: readonly HardMix[] = [];

function RemakeNews({ remake }: { readonly remake: Remake }) {
  const { t } = useTranslation('wizard-safety');
  return (
    <div role="status" className="empty:hidden">
      {remake === 'working' && <Callout tone="info">{t('start.remaking')}</Callout>}
      {remake === 'done' && <Callout tone="good">{t('start.remade')}</Callout>}
      {remake === 'failed' && <Callout tone="caution">{t('start.remakeFailed')}</Callout>}
    </div>
  );
}

/** The hardest runs of the chosen plan, each to be decided on; ruling one out makes the plan again. */
export function LookPart({ isChecked }: Props) {
  const { t, i18n } = useTranslation('wizard-safety');
  const { mayWrite, answers, shop, flush } = useWizard();
  const { now, refresh } = useStanding();
  const { plan } = now;
  const { content, set } = useAnswer('look');
  const { remake, ask } = useRemake();
  const { list } = formatsFor(i18n.language as Language, shop.timeZone);
  const hardest = plan?.hardest ?? noHardest;
  const gone = ruledOutMixes(content, hardest);

  const mixWords = (ends: LookedMix['ends']) => list(mixParts(ends, answers.settings?.settings ?? []));

  function decide(decided: LookedMix): void {
    const before = decisionOn(answers, decided);
    set(decideMix(content, hardest, decided));
    if ((before === 'ruledOut') !== (decided.decision === 'ruledOut')) ask(decided);
    // What is left to the engineer may make a second person due.
    else void flush().then(refresh);
  }

  return (
    <QuestionPart title={t('start.look')} help={plan ? t('start.lookHelp') : t('start.lookNoPlan')}>
      {plan && (
        <ul className="grid grid-cols-[minmax(0,1fr)] gap-6">
          {hardest.map((mix) => (
            <HardRun
              key={mixKey(mix.ends)}
              mix={mix}
              plan={plan}
              decision={decisionOn(answers, mix)}
              isChecked={isChecked}
              isBusy={remake === 'working'}
              onDecide={(decision) => decide({ ends: mix.ends, decision })}
            />
          ))}
        </ul>
      )}
      <RemakeNews remake={remake} />
      {gone.length > 0 && (
        <div className="grid gap-2">
          <h3>{t('start.ruledOut')}</h3>
          <ul className="grid gap-2">
            {gone.map(({ ends }) => (
              <li key={mixKey(ends)} className="flex flex-wrap items-center justify-between gap-x-4">
                <span>{mixWords(ends)}</span>
                {mayWrite && (
                  <Button
                    kind="quiet"
                    disabled={remake === 'working'}
                    onClick={() => decide({ ends, decision: undefined })}
                  >
                    {t('start.putBack')}
                    <span className="sr-only"> {mixWords(ends)}</span>
                  </Button>
                )}
              </li>
            ))}
          </ul>
        </div>
      )}
    </QuestionPart>
  );
}
