import { Callout } from '../../../components/ui/Callout.tsx';
import type { AuditModelView } from '../audit-view.ts';
import type { AuditWording } from '../audit-wording.ts';

interface Props extends Pick<AuditWording, 't'> {
  readonly model: AuditModelView;
}

/** What these figures are: those of a verdict, of readings that changed since, or of an engineer's own model. */
export function ModelOrigin({ model, t }: Props) {
  const { name, verdict, inputHash } = model;
  const hash = <code className="break-all text-small">{inputHash}</code>;
  if (name !== null) {
    return (
      <Callout tone="caution" title={t('audit-model:origin.own', { name })}>
        {t('audit-model:origin.ownWords')}
      </Callout>
    );
  }
  if (!verdict)
    return (
      <Callout tone="caution" title={t('audit-model:origin.changed')}>
        {hash}
      </Callout>
    );
  const tones = { same: 'good', otherCore: 'info', differs: 'stop' } as const;
  return (
    <Callout tone={tones[verdict.agrees]} title={t('audit-model:origin.verdict', { n: verdict.n })}>
      <p>{t(`audit-model:origin.${verdict.agrees}`, { core: verdict.coreVersion })}</p>
      {hash}
    </Callout>
  );
}
