import { useTranslation } from 'react-i18next';
import { aroundThings } from '../../answer-choices.ts';
import { QuestionPart } from '../QuestionPart.tsx';
import { StepHead } from '../StepHead.tsx';
import { useAnswer } from '../use-answer.tsx';
import { AroundRow } from './AroundRow.tsx';
import { OwnThings } from './OwnThings.tsx';

/** What may change while the trial runs, and what is done about each. */
export function AroundQuestions() {
  const { t } = useTranslation('wizard-safety');
  const { content, set, errorAt, section, mayWrite } = useAnswer('around');
  return (
    <>
      <StepHead title={t('around.title')} help={t('around.help')} />
      <div {...section}>
        <QuestionPart>
          {aroundThings.map((thing) => (
            <AroundRow
              key={thing}
              thing={thing}
              answer={content[thing] ?? {}}
              errorAt={errorAt}
              onChange={(next) => set({ ...content, [thing]: next })}
            />
          ))}
          <OwnThings
            own={content.own ?? []}
            errorAt={errorAt}
            mayWrite={mayWrite}
            onChange={(own) => set({ ...content, own })}
          />
        </QuestionPart>
      </div>
    </>
  );
}
