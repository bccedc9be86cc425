import { Disclosure } from '../../../components/ui/Disclosure.tsx';
import { type FigureName, figureSources } from '../../../lib/doe/index.ts';
import type { AuditWording } from '../audit-wording.ts';

interface Props extends Pick<AuditWording, 't'> {
  readonly of: readonly FigureName[];
}

/** How the figures above are made: formula, what goes in, who published the method. Closed until somebody asks. */
export function FigureSources({ of, t }: Props) {
  return (
    <Disclosure summary={t('audit-source:summary')}>
      <dl className="figure-sources">
        {of.map((name) => (
          <div key={name}>
            <dt>{t(`audit-source:name.${name}`)}</dt>
            <dd>
              <p>
                <code translate="no">{figureSources[name].formula}</code>
              </p>
              <p>{t(`audit-source:inputs.${name}`)}</p>
              <p className="text-steel" translate="no">
                {figureSources[name].source}
              </p>
            </dd>
          </div>
        ))}
      </dl>
    </Disclosure>
  );
}
