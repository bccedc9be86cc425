import type { ResourceLanguage } from 'i18next';
import { useState } from 'react';
import { useForm, useWatch } from 'react-hook-form';
import { useTranslation } from 'react-i18next';
import { IslandRoot } from '../../components/island/IslandRoot.tsx';
import { schemaResolver } from '../../components/island/schema-resolver.ts';
import { useSubmission } from '../../components/island/use-submission.ts';
import { ActionBar } from '../../components/ui/ActionBar.tsx';
import { Button } from '../../components/ui/Button.tsx';
import { Callout } from '../../components/ui/Callout.tsx';
import { Toast, ToastList } from '../../components/ui/Toast.tsx';
import { useToasts } from '../../components/ui/use-toasts.ts';
import type { Language } from '../../i18n/languages.ts';
import { FaultCallout } from '../people/FaultCallout.tsx';
import { ReviewFields } from './ReviewFields.tsx';
import { ShopFields } from './ShopFields.tsx';
import { changeShopCall } from './shop.queries.ts';
import { changeShopSchema, type PublicShop, publicShopSchema, shopFormSchema } from './shop.schema.ts';
import { type ShopFormValues, shopValues, toShopFields } from './shop-form.ts';
import { TextFields } from './TextFields.tsx';

interface Props {
  readonly language: Language;
  readonly words: ResourceLanguage;
  readonly first: PublicShop;
  /** The zones that the server knows: a browser's own list may differ. */
  readonly timeZones: readonly string[];
}

type FieldName = keyof ShopFormValues;

function fieldOf(pointer: string): FieldName {
  return pointer.replace(/^#\//, '') as FieldName;
}

/** The rules of the shop. */
export function ShopForm({ language, words, ...rest }: Props) {
  return (
    <IslandRoot language={language} words={words}>
      <ShopRules {...rest} />
    </IslandRoot>
  );
}

function ShopRules({ first, timeZones }: Pick<Props, 'first' | 'timeZones'>) {
  const { t } = useTranslation('shop');
  const { t: tErrors } = useTranslation('errors');
  const [shop, setShop] = useState(first);
  const [theirs, setTheirs] = useState<PublicShop | null>(null);
  const { toasts, show, close } = useToasts();
  const form = useForm<ShopFormValues>({
    defaultValues: shopValues(first),
    mode: 'onTouched',
    resolver: schemaResolver<ShopFormValues>({
      schema: shopFormSchema,
      toInput: toShopFields,
      fieldOf,
      t: (key, values) => tErrors(key.replace('errors:', '') as 'field.missing', values),
    }),
  });
  const { busy, fault, submit } = useSubmission((problem) => {
    const present = publicShopSchema.safeParse(problem.present);
    setTheirs(problem.code === 'changed-meanwhile' && present.success ? present.data : null);
    problem.errors.forEach(({ pointer, code, detail }, place) => {
      form.setError(fieldOf(pointer), { type: code, message: detail }, { shouldFocus: place === 0 });
    });
  });
  const planReview = useWatch({ control: form.control, name: 'planReview' });

  function takeOver(changed: PublicShop): void {
    setShop(changed);
    setTheirs(null);
    form.reset(shopValues(changed));
  }

  const save = (revision: number) =>
    form.handleSubmit((values) =>
      submit(async () => {
        takeOver(await changeShopCall(changeShopSchema.parse({ ...toShopFields(values), revision })));
        show('good', t('saved'));
      }),
    );

  return (
    <form noValidate className="grid max-w-180 gap-8" onSubmit={save(shop.revision)}>
      <ShopFields form={form} timeZones={timeZones} />
      <TextFields form={form} />
      <ReviewFields form={form} asksStatement={planReview === 'never'} />
      {theirs ? (
        <Callout
          tone="caution"
          live="assertive"
          title={t('changedTitle')}
          actions={
            <>
              <Button onClick={() => takeOver(theirs)}>{t('takeTheirs')}</Button>
              <Button onClick={save(theirs.revision)}>{t('keepMine')}</Button>
            </>
          }
        />
      ) : (
        <FaultCallout fault={fault} />
      )}
      <ActionBar>
        <Button kind="primary" type="submit" busy={busy} busyLabel={t('saving')}>
          {t('save')}
        </Button>
      </ActionBar>
      <ToastList label={t('notices')}>
        {toasts.map(({ id, tone, words }) => (
          <Toast key={id} tone={tone} closeLabel={t('close')} onClose={() => close(id)}>
            {words}
          </Toast>
        ))}
      </ToastList>
    </form>
  );
}
