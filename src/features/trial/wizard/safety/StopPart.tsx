import type { ChangeEvent } from 'react';
import { useTranslation } from 'react-i18next';
import { Choice } from '../../../../components/ui/Choice.tsx';
import { stopRules } from '../../answer-choices.ts';
import { QuestionPart } from '../QuestionPart.tsx';
import { useAnswer } from '../use-answer.tsx';
import { OwnStopRule } from './OwnStopRule.tsx';

/** When to stop: rules that are there in every language, and the shop's own words. */
export function StopPart() {
  const { t } = useTranslation(['wizard-safety', 'safety']);
  const { content, set, errorAt, section } = useAnswer('stop');

  function pick({ target: { value, checked } }: ChangeEvent<HTMLInputElement>): void {
    const picked = stopRules.filter((rule) => (rule === value ? checked : content.picked.includes(rule)));
    set({ ...content, picked });
  }

  return (
    <QuestionPart title={t('safety.stop')}>
      <div className="grid grid-cols-[minmax(0,1fr)] gap-6" {...section}>
        <Choice
          id="stop-rules"
          name="#/picked"
          legend={t('safety.stopPick')}
          several
          options={stopRules.map((rule) => ({ value: rule, label: t(`safety:stop.${rule}`) }))}
          value={content.picked}
          onChange={pick}
          error={errorAt('#/picked')}
        />
        <OwnStopRule own={content.own ?? {}} onChange={(own) => set({ ...content, own })} errorAt={errorAt} />
      </div>
    </QuestionPart>
  );
}
