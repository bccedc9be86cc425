import { useTranslation } from 'react-i18next';
import { aroundThings } from '../../answer-choices.ts';
import { splitThings } from '../../finished/around.schema.ts';
import { QuestionPart } from '../QuestionPart.tsx';
import { StepHead } from '../StepHead.tsx';
import { useAnswer } from '../use-answer.tsx';
import { AroundRow } from './AroundRow.tsx';
import { OwnThings } from './OwnThings.tsx';

/** What may change while the trial runs, and what is done about each. */
export function AroundQuestions() {
  const { t } = useTranslation('wizard-safety');
  const { t: tErrors } = useTranslation('errors');
  const { content, set, errorAt, section, mayWrite } = useAnswer('around');
  // Said at once: whoever splits by a second thing thinks the first one still holds.
  const [, second] = splitThings.filter((thing) => content[thing]?.way === 'split');
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
              fault={thing === second ? tErrors('field.one-split') : undefined}
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
