import type { UseFormReturn } from 'react-hook-form';
import { useTranslation } from 'react-i18next';
import { Select } from '../../components/ui/Select.tsx';
import { TextInput } from '../../components/ui/TextInput.tsx';
import { currencies } from '../../i18n/currencies.ts';
import { languageNames, languages } from '../../i18n/languages.ts';
import type { ShopFormValues } from './shop-form.ts';

export interface ShopPart {
  readonly form: UseFormReturn<ShopFormValues>;
}

/** What the shop is: its name, clock, language and money. */
export function ShopFields({ form, timeZones }: ShopPart & { readonly timeZones: readonly string[] }) {
  const { t } = useTranslation('shop');
  const { register, formState } = form;
  const { errors } = formState;
  return (
    <section className="sheet grid gap-6" aria-labelledby="part-shop">
      <h2 id="part-shop">{t('part.shop')}</h2>
      <TextInput
        id="name"
        label={t('name')}
        help={t('nameHelp')}
        autoComplete="off"
        error={errors.name?.message}
        {...register('name')}
      />
      <Select
        id="timeZone"
        label={t('timeZone')}
        help={t('timeZoneHelp')}
        options={timeZones.map((zone) => ({ value: zone, label: zone.replaceAll('_', ' ') }))}
        error={errors.timeZone?.message}
        {...register('timeZone')}
      />
      <div className="grid gap-6 sm:grid-cols-2">
        <Select
          id="language"
          label={t('language')}
          options={languages.map((each) => ({ value: each, label: languageNames[each] }))}
          error={errors.language?.message}
          {...register('language')}
        />
        <Select
          id="currency"
          label={t('currency')}
          options={currencies.map((code) => ({ value: code, label: code }))}
          error={errors.currency?.message}
          {...register('currency')}
        />
      </div>
    </section>
  );
}
