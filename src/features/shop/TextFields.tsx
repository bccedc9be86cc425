import { useTranslation } from 'react-i18next';
import { Checkbox } from '../../components/ui/Checkbox.tsx';
import { NumberInput } from '../../components/ui/NumberInput.tsx';
import { TextInput } from '../../components/ui/TextInput.tsx';
import type { ShopPart } from './ShopFields.tsx';

/** How texts go out and how long their words are kept. */
export function TextFields({ form }: ShopPart) {
  const { t } = useTranslation('shop');
  const { register, formState } = form;
  const { errors } = formState;
  const optional = t('optional');
  return (
    <section className="sheet grid gap-6" aria-labelledby="part-texts">
      <h2 id="part-texts">{t('part.texts')}</h2>
      <TextInput
        id="textNumber"
        type="tel"
        label={t('textNumber')}
        mark={optional}
        help={t('textNumberHelp')}
        autoComplete="off"
        error={errors.textNumber?.message}
        {...register('textNumber')}
      />
      <fieldset className="field">
        <legend className="field-label">
          {t('quiet')} <span className="field-mark">{optional}</span>
        </legend>
        <p className="field-help">{t('quietHelp')}</p>
        <div className="flex flex-wrap gap-4">
          <TextInput
            id="quietFromMinute"
            inputMode="numeric"
            autoComplete="off"
            maxLength={5}
            label={t('quietFrom')}
            error={errors.quietFromMinute?.message}
            {...register('quietFromMinute')}
          />
          <TextInput
            id="quietToMinute"
            inputMode="numeric"
            autoComplete="off"
            maxLength={5}
            label={t('quietTo')}
            error={errors.quietToMinute?.message}
            {...register('quietToMinute')}
          />
        </div>
      </fieldset>
      <Checkbox
        id="plainLetters"
        label={t('plainLetters')}
        help={t('plainLettersHelp')}
        {...register('plainLetters')}
      />
      <NumberInput
        id="monthlyTextLimit"
        label={t('monthlyTextLimit')}
        mark={optional}
        help={t('monthlyTextLimitHelp')}
        error={errors.monthlyTextLimit?.message}
        {...register('monthlyTextLimit')}
      />
      <NumberInput
        id="keepTextsDays"
        label={t('part.keeping')}
        help={t('keepTextsDaysHelp')}
        unit={t('days')}
        error={errors.keepTextsDays?.message}
        {...register('keepTextsDays')}
      />
    </section>
  );
}
