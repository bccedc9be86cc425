import { useTranslation } from 'react-i18next';
import { Checkbox } from '../../../../components/ui/Checkbox.tsx';
import { type readyChecks as checks, readyChecks } from '../../answer-choices.ts';
import { QuestionPart } from '../QuestionPart.tsx';
import { useAnswer } from '../use-answer.tsx';

type ReadyCheck = (typeof checks)[number];

interface Props {
  /** Whether a start was tried, so that lines still open are named. */
  readonly isChecked: boolean;
}

/** A short list to go through at the machine. */
export function ReadyPart({ isChecked }: Props) {
  const { t } = useTranslation('wizard-safety');
  const { t: tErrors } = useTranslation('errors');
  const { content, set } = useAnswer('ready');

  function tick(check: ReadyCheck, isTicked: boolean): void {
    const ticked = readyChecks.filter((each) => (each === check ? isTicked : content.ticked.includes(each)));
    set({ ticked });
  }

  const isOpen = content.ticked.length < readyChecks.length;
  return (
    <QuestionPart title={t('start.ready')}>
      <div>
        {readyChecks.map((check) => (
          <Checkbox
            key={check}
            id={`ready-${check}`}
            label={t(`start.check.${check}`)}
            checked={content.ticked.includes(check)}
            onChange={({ target }) => tick(check, target.checked)}
          />
        ))}
        {isChecked && isOpen && <p className="field-error">{tErrors('field.tick-all')}</p>}
      </div>
    </QuestionPart>
  );
}
