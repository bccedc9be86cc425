import { createContext, useContext, useEffect, useState } from 'react';
import { type DefaultValues, type FieldValues, type UseFormReturn, useForm } from 'react-hook-form';
import { useTranslation } from 'react-i18next';
import { schemaResolver } from '../../../components/island/schema-resolver.ts';
import type { AnswerOf, QuestionName } from '../answers.schema.ts';
import { finishedSchemas, untouched } from '../finished.schema.ts';
import { tidy } from './stored-answers.ts';

/** What the forms of a page share with its frame. */
export interface WizardForms {
  mayWrite: boolean;
  contentOf(question: QuestionName): unknown;
  change<Name extends QuestionName>(question: Name, content: AnswerOf<Name>): void;
  fill<Name extends QuestionName>(question: Name, content: AnswerOf<Name> | undefined): void;
  onReplaced(hear: (question: QuestionName) => void): () => void;
  /** Has the form checked along with the page; the first that is not content gets the focus. */
  addCheck(check: (focus: boolean) => Promise<boolean>): () => void;
}

export const WizardFormsContext = createContext<WizardForms | null>(null);

/** Stays the same while somebody types, so that what leans on it alone is not drawn again. @throws RangeError outside the wizard's frame */
export function useForms(): WizardForms {
  const forms = useContext(WizardFormsContext);
  if (!forms) throw new RangeError('useForms: no WizardFrame around it');
  return forms;
}

/** Puts an answer into its form from outside it, as a starter does; it is saved like what was typed. */
export function useFill(): WizardForms['fill'] {
  return useForms().fill;
}

function toField(pointer: string): string {
  return pointer.slice(2).replaceAll('/', '.');
}

/**
 * A list that has just got or lost an item is checked as a whole: an item nobody has reached yet would be red at once. Its
 * fields speak up when they are left, and when the page is checked.
 */
function asksForList(names: readonly string[] | undefined, values: FieldValues): boolean {
  const [name, ...others] = names ?? [];
  return name !== undefined && others.length === 0 && Array.isArray(values[name]);
}

/**
 * The form of one question: begins with what was typed before, hands on every change, and says what is missing once a
 * field was left or the page was checked. Fields that come from elsewhere meanwhile (another tab, the other text of two)
 * are put in.
 * @throws RangeError outside the wizard's frame
 */
export function useQuestionForm<Name extends QuestionName>(
  question: Name,
): UseFormReturn<AnswerOf<Name> & FieldValues> {
  type Values = AnswerOf<Name> & FieldValues;
  const { t } = useTranslation('errors');
  const forms = useForms();
  const { change } = forms;
  const [first] = useState(() => (forms.contentOf(question) ?? untouched[question]) as DefaultValues<Values>);
  const resolver = schemaResolver<Values>({
    schema: finishedSchemas[question],
    toInput: tidy,
    fieldOf: toField,
    t: (key, values) => t(key.replace('errors:', '') as 'field.missing', values),
  });
  const form = useForm<Values>({
    defaultValues: first,
    mode: 'onTouched',
    resolver: (values, context, options) =>
      asksForList(options.names, values) ? { values, errors: {} } : resolver(values, context, options),
  });

  useEffect(
    () =>
      form.subscribe({
        formState: { values: true },
        callback: ({ values }) => change(question, tidy(values) as AnswerOf<Name>),
      }),
    [form, change, question],
  );
  useEffect(
    () =>
      forms.onReplaced((replaced) => {
        if (replaced === question) form.reset((forms.contentOf(question) ?? untouched[question]) as Values);
      }),
    [forms, form, question],
  );
  useEffect(() => forms.addCheck((focus) => form.trigger(undefined, { shouldFocus: focus })), [forms, form]);
  return form;
}
