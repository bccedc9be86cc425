import { useTranslation } from 'react-i18next';
import { Button } from '../../../../components/ui/Button.tsx';
import { TextInput } from '../../../../components/ui/TextInput.tsx';
import type { AnswerOf } from '../../answers.schema.ts';
import { QuestionPart } from '../QuestionPart.tsx';
import { useAnswer } from '../use-answer.tsx';

type CallLine = AnswerOf<'call'>['lines'][number];

const mostLines = 4;

/** The line that stands ready; the same on the server and in the browser. */
const blank: CallLine = { id: 'first' };

/** Whom to call, a line for each shift. The first line stands ready and is kept once something is typed in it. */
export function CallPart() {
  const { t } = useTranslation('wizard-safety');
  const { content, set, errorAt, section, mayWrite } = useAnswer('call');
  const lines = content.lines.length > 0 ? content.lines : [blank];

  function write(line: CallLine): void {
    set({ lines: lines.map((each) => (each.id === line.id ? line : each)) });
  }
  function add(): void {
    const line = { id: crypto.randomUUID() };
    set({ lines: [...lines, line] });
    requestAnimationFrame(() => document.getElementById(`call-${line.id}-when`)?.focus());
  }

  return (
    <QuestionPart title={t('safety.call')} help={t('safety.callHelp')}>
      <div className="grid grid-cols-[minmax(0,1fr)] gap-4" {...section}>
        {lines.map((line, place) => (
          <fieldset key={line.id} className="field-row">
            <legend className="sr-only">{t('safety.line', { number: place + 1 })}</legend>
            <TextInput
              id={`call-${line.id}-when`}
              name={`#/lines/${place}/when`}
              label={t('safety.callWhen')}
              placeholder={t('safety.callWhenExample')}
              maxLength={200}
              value={line.when ?? ''}
              onChange={(event) => write({ ...line, when: event.target.value })}
              error={errorAt(`#/lines/${place}/when`)}
            />
            <TextInput
              id={`call-${line.id}-whom`}
              name={`#/lines/${place}/whom`}
              label={t('safety.callWhom')}
              placeholder={t('safety.callWhomExample')}
              maxLength={200}
              value={line.whom ?? ''}
              onChange={(event) => write({ ...line, whom: event.target.value })}
              error={
                errorAt(`#/lines/${place}/whom`) ??
                (content.lines.length === 0 ? errorAt('#/lines') : undefined)
              }
            />
            {lines.length > 1 && mayWrite && (
              <Button
                kind="quiet"
                icon="remove"
                onClick={() => set({ lines: lines.filter((each) => each !== line) })}
              >
                {t('safety.remove')}
                <span className="sr-only"> {t('safety.line', { number: place + 1 })}</span>
              </Button>
            )}
          </fieldset>
        ))}
        {lines.length < mostLines && mayWrite && (
          <div>
            <Button icon="plus" onClick={add}>
              {t('safety.callAdd')}
            </Button>
          </div>
        )}
      </div>
    </QuestionPart>
  );
}
