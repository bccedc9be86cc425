import { useTranslation } from 'react-i18next';
import { Callout } from '../../components/ui/Callout.tsx';
import { Choice } from '../../components/ui/Choice.tsx';
import { TextArea } from '../../components/ui/TextArea.tsx';
import type { ShopPart } from './ShopFields.tsx';
import { reviewRules } from './shop.ts';

const subjects = ['planReview', 'verdictReview', 'adoptionReview'] as const;

/** When an engineer looks. Leaving plans unseen takes a statement of who answers for safety. */
export function ReviewFields({ form, asksStatement }: ShopPart & { readonly asksStatement: boolean }) {
  const { t } = useTranslation('shop');
  const { register, formState } = form;
  const { errors } = formState;
  const options = reviewRules.map((rule) => ({ value: rule, label: t(`rule.${rule}`) }));
  return (
    <section className="sheet grid gap-6" aria-labelledby="part-reviews">
      <h2 id="part-reviews">{t('part.reviews')}</h2>
      {subjects.map((subject) => (
        <div key={subject} className="grid gap-4">
          <Choice
            id={subject}
            legend={t(subject)}
            options={options}
            error={errors[subject]?.message}
            {...register(subject)}
          />
          {subject === 'planReview' && asksStatement && (
            <>
              <Callout tone="caution">{t('statementCaution')}</Callout>
              <TextArea
                id="reviewStatement"
                label={t('statement')}
                help={t('statementHelp')}
                rows={2}
                error={errors.reviewStatement?.message}
                {...register('reviewStatement')}
              />
            </>
          )}
        </div>
      ))}
    </section>
  );
}
