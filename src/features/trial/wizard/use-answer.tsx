import { type FocusEvent, useContext, useEffect, useRef, useState } from 'react';
import { useTranslation } from 'react-i18next';
import { fieldSentence } from '../../../i18n/field-codes.ts';
import { readFinished } from '../answer-problem.ts';
import type { AnswerOf, QuestionName } from '../answers.schema.ts';
import { contentOf } from '../finished.schema.ts';
import { WizardFormsContext } from './use-question-form.tsx';
import { useWizard } from './wizard-context.ts';

const wrongField = '[aria-invalid="true"], .choice-invalid input';

/**
 * One question whose fields come and go with what is picked. The page's answers are its only memory, so what another tab
 * saves shows at once. The name of a field is its JSON pointer within the answer; what is wrong with it is said once it
 * was left or the page was checked.
 * @throws RangeError outside the wizard's frame
 */
export function useAnswer<Name extends QuestionName>(question: Name) {
  const { answers, change, mayWrite } = useWizard();
  const forms = useContext(WizardFormsContext);
  const { t } = useTranslation('errors');
  const section = useRef<HTMLDivElement>(null);
  const [left, setLeft] = useState<ReadonlySet<string>>(new Set());
  const [isChecked, setChecked] = useState(false);
  const content = contentOf(answers, question);
  const read = readFinished(answers, question);
  const problems = 'problems' in read ? read.problems : [];
  const isContent = useRef(true);
  isContent.current = problems.length === 0;

  useEffect(
    () =>
      forms?.addCheck(async (focus) => {
        setChecked(true);
        // The fields say what is wrong only after the next drawing.
        if (focus && !isContent.current) {
          requestAnimationFrame(() => section.current?.querySelector<HTMLElement>(wrongField)?.focus());
        }
        return isContent.current;
      }),
    [forms],
  );

  function errorAt(pointer: string): string | undefined {
    const problem = problems.find((each) => each.pointer === pointer);
    if (!problem || !(isChecked || left.has(pointer))) return undefined;
    return fieldSentence(
      (key, values) => t(key.replace('errors:', '') as 'field.missing', values),
      problem.code,
      problem.values,
    );
  }

  return {
    content,
    mayWrite,
    set: (next: AnswerOf<Name>) => change(question, next),
    errorAt,
    /** Goes around the fields of the question. */
    section: {
      ref: section,
      onBlur(event: FocusEvent<HTMLElement>) {
        const name = event.target.getAttribute('name');
        if (name !== null) setLeft((before) => new Set(before).add(name));
      },
    },
  };
}
