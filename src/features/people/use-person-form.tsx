import { useForm } from 'react-hook-form';
import { useTranslation } from 'react-i18next';
import type { ServerProblem } from '../../components/island/call-server.ts';
import { schemaResolver } from '../../components/island/schema-resolver.ts';
import { personFormSchema } from './person.schema.ts';
import { formFieldOf, type PersonFormValues, toPersonFields } from './person-form.ts';

type FieldName = Parameters<ReturnType<typeof useForm<PersonFormValues>>['setError']>[0];

/** The form of a person, checked as the endpoint checks it, with the focus on the first answer that does not fit. */
export function usePersonForm(defaultValues: PersonFormValues) {
  const { t } = useTranslation('errors');
  const form = useForm<PersonFormValues>({
    defaultValues,
    mode: 'onTouched',
    resolver: schemaResolver<PersonFormValues>({
      schema: personFormSchema,
      toInput: toPersonFields,
      fieldOf: formFieldOf,
      t: (key, values) => t(key.replace('errors:', '') as 'field.missing', values),
    }),
  });

  /** Puts the server's refusals at their fields. */
  function showRefusals(problem: ServerProblem): void {
    problem.errors.forEach(({ pointer, code, detail }, place) => {
      const field = formFieldOf(pointer) as FieldName;
      form.setError(field, { type: code, message: detail }, { shouldFocus: place === 0 });
    });
  }

  return { form, showRefusals };
}
