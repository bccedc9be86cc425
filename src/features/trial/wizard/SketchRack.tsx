import { useTranslation } from 'react-i18next';
import { SmallTag } from '../../../components/ui/SmallTag.tsx';
import { formatsFor } from '../../../i18n/format.ts';
import type { Language } from '../../../i18n/languages.ts';
import type { FactorSpec, PlannedRun } from '../../../lib/doe/index.ts';
import { settingMarkOf } from '../setting-mark.ts';

interface Props {
  readonly runs: readonly PlannedRun[];
  readonly factors: readonly FactorSpec[];
}

const mostTags = 5;
const mostSettings = 5;

/** The first runs as small tags with the shop's own names. */
export function SketchRack({ runs, factors }: Props) {
  const { t, i18n } = useTranslation('wizard-frame');
  const { number, list } = formatsFor(i18n.language as Language, 'UTC');
  const shown = factors.slice(0, mostSettings);
  return (
    <>
      <div className="small-rack">
        {runs.slice(0, mostTags).map((run) => {
          const settings = shown.map((factor, place) => ({
            name: factor.name,
            mark: settingMarkOf(factor, run.coded[place] ?? 0),
          }));
          const spoken = factors.map((factor, place) => {
            const value = run.actual[place] ?? '';
            return `${factor.name} ${typeof value === 'number' ? number(value) : value}`;
          });
          const name = t('soFar.tag', { number: run.order, settings: list(spoken) });
          return <SmallTag key={run.order} number={String(run.order)} name={name} settings={settings} />;
        })}
      </div>
      {runs.length > mostTags && (
        <p className="text-steel">{t('soFar.andMore', { count: runs.length - mostTags })}</p>
      )}
    </>
  );
}
