import { ButtonLink } from '../../../components/ui/ButtonLink.tsx';
import type { Translate } from '../../../i18n/translator.ts';

interface Props {
  readonly trialId: string;
  readonly t: Translate;
}

/** Where the audit pack of a trial is fetched; for readers who may. */
export function PackPart({ trialId, t }: Props) {
  const address = `/api/trials/${trialId}`;
  return (
    <section className="grid gap-3" aria-labelledby="audit-pack">
      <h2 id="audit-pack">{t('audit-pack:title')}</h2>
      <p>{t('audit-pack:note')}</p>
      <div className="button-row">
        <ButtonLink href={`${address}/pack`} icon="paper">
          {t('audit-pack:get')}
        </ButtonLink>
        <ButtonLink href={`${address}/trial.json`}>{t('audit-pack:trialFile')}</ButtonLink>
      </div>
    </section>
  );
}
