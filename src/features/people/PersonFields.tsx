import { type UseFormReturn, useWatch } from 'react-hook-form';
import { useTranslation } from 'react-i18next';
import { Checkbox } from '../../components/ui/Checkbox.tsx';
import { Choice } from '../../components/ui/Choice.tsx';
import { Select } from '../../components/ui/Select.tsx';
import { TextInput } from '../../components/ui/TextInput.tsx';
import { languageNames, languages } from '../../i18n/languages.ts';
import { personRoles, signsIn } from './person.ts';
import type { PersonFormValues } from './person-form.ts';
import type { Reach } from './reach.ts';
import { WorkHoursField } from './WorkHoursField.tsx';

interface Props {
  readonly form: UseFormReturn<PersonFormValues>;
  readonly reach: Reach;
  /** The number there is now, as far as the reader may see it; null for a new person or one without. */
  readonly phoneShown: string | null;
  /** Whether the field holds the whole number, or only a new one may be typed. */
  readonly phoneHidden: boolean;
}

/** All that is asked about a person. What does not fit the kind or the roles is not shown. */
export function PersonFields({ form, reach, phoneShown, phoneHidden }: Props) {
  const { t } = useTranslation('people');
  const { control, register, formState } = form;
  const { errors } = formState;
  const [kind, roles, language] = useWatch({ control, name: ['kind', 'roles', 'language'] });
  const isPerson = kind === 'person';
  const optional = t('form.optional');
  return (
    <>
      <Choice
        id="kind"
        legend={t('form.kind')}
        shape="cards"
        options={[
          { value: 'person', label: t('form.kindPerson'), help: t('form.kindPersonHelp') },
          { value: 'line phone', label: t('linePhone'), help: t('form.kindLineHelp') },
        ]}
        error={errors.kind?.message}
        {...register('kind')}
      />
      <TextInput
        id="name"
        label={isPerson ? t('form.name') : t('form.lineName')}
        autoComplete="off"
        error={errors.name?.message}
        {...register('name')}
      />
      {isPerson && reach === 'everybody' && (
        <Choice
          id="roles"
          legend={t('form.roles')}
          help={t('form.rolesHelp')}
          shape="cards"
          several
          options={personRoles.map((role) => ({
            value: role,
            label: t(`role.${role}`),
            help: t(`roleHelp.${role}`),
          }))}
          error={errors.roles?.message}
          {...register('roles')}
        />
      )}
      <TextInput
        id="phone"
        type="tel"
        label={t('form.phone')}
        mark={isPerson ? optional : undefined}
        help={
          phoneHidden && phoneShown !== null
            ? t('form.phoneKept', { shown: phoneShown })
            : t('form.phoneHelp')
        }
        autoComplete="off"
        error={errors.phone?.message}
        {...register('phone')}
      />
      {isPerson && reach === 'everybody' && (
        <TextInput
          id="email"
          type="email"
          label={t('form.email')}
          mark={signsIn(roles) ? undefined : optional}
          help={t('form.emailHelp')}
          autoComplete="off"
          error={errors.email?.message}
          {...register('email')}
        />
      )}
      <Select
        id="language"
        label={t('form.language')}
        options={languages.map((each) => ({ value: each, label: languageNames[each] }))}
        error={errors.language?.message}
        {...register('language')}
      />
      {language === 'vi' && (
        <Choice
          id="plainLetters"
          legend={t('form.marks')}
          legendHidden
          shape="cards"
          options={[
            { value: 'plain', label: t('form.noMarks'), help: t('form.noMarksHelp') },
            { value: 'marked', label: t('form.marks'), help: t('form.marksHelp') },
          ]}
          {...register('plainLetters')}
        />
      )}
      <WorkHoursField control={control} />
      {isPerson && reach === 'everybody' && (
        <Checkbox
          id="safetyPerson"
          label={t('form.safetyPerson')}
          help={t('form.safetyPersonHelp')}
          {...register('safetyPerson')}
        />
      )}
    </>
  );
}
