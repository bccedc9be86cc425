import { type ChangeEvent, useRef } from 'react';
import { useTranslation } from 'react-i18next';
import { Callout } from '../../../../components/ui/Callout.tsx';
import { Choice } from '../../../../components/ui/Choice.tsx';
import { hazardNames } from '../../answer-choices.ts';
import type { AnswerOf } from '../../answers.schema.ts';
import { QuestionPart } from '../QuestionPart.tsx';
import { useAnswer } from '../use-answer.tsx';
import { useWizard } from '../wizard-context.ts';
import { HazardCautions } from './HazardCautions.tsx';
import { hazardSigns } from './hazard-signs.tsx';

type Ticked = AnswerOf<'hazards'>['ticked'][number];

/** What can hurt someone, and what protects people from it. "None of these" is a statement of its own. */
export function HazardsPart() {
  const { t } = useTranslation(['wizard-safety', 'safety']);
  const { shop } = useWizard();
  const { content, set, errorAt, section } = useAnswer('hazards');
  // A hazard ticked off by accident and on again has its words back.
  const known = useRef(new Map<string, Ticked>());
  const { ticked, none } = content;

  function pick({ target: { value, checked } }: ChangeEvent<HTMLInputElement>): void {
    for (const each of ticked) known.current.set(each.hazard, each);
    if (value === 'none') {
      set(checked ? { none: true, ticked: [] } : { ticked: [] });
      return;
    }
    const next = hazardNames.flatMap((hazard) => {
      const present = ticked.find((each) => each.hazard === hazard);
      if (hazard !== value) return present ?? [];
      return checked ? (known.current.get(hazard) ?? { hazard, cautions: [] }) : [];
    });
    set({ ticked: next });
  }

  const options = hazardNames.map((hazard) => ({
    value: hazard,
    label: t(`safety:hazard.${hazard}`),
    hazard: hazardSigns[hazard],
  }));
  return (
    <QuestionPart title={t('safety.hazards')} help={t('safety.hazardsHelp')}>
      <div className="grid grid-cols-[minmax(0,1fr)] gap-6" {...section}>
        <Choice
          id="hazards"
          name="#/none"
          legend={t('safety.hazards')}
          legendHidden
          several
          options={[...options, { value: 'none', label: t('safety.none') }]}
          value={[...ticked.map(({ hazard }) => hazard), ...(none ? ['none'] : [])]}
          onChange={pick}
          error={errorAt('#/none')}
        />
        {ticked.map((hazard, place) => (
          <HazardCautions
            key={hazard.hazard}
            ticked={hazard}
            name={`#/ticked/${place}/protects`}
            error={errorAt(`#/ticked/${place}/protects`)}
            onChange={(next) => set({ ticked: ticked.map((each) => (each === hazard ? next : each)) })}
          />
        ))}
        <div className="grid gap-2 empty:hidden" role="status">
          {ticked.length > 0 && (
            <>
              <Callout tone="caution">
                <p className="font-semibold">{t('safety.noGuardOff')}</p>
                <p>{t('safety.notSafetySystem')}</p>
              </Callout>
              {shop.planReview !== 'never' && <Callout tone="info">{t('safety.lookedAtFirst')}</Callout>}
            </>
          )}
        </div>
      </div>
    </QuestionPart>
  );
}
