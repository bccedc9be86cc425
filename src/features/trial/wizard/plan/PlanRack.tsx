import { useTranslation } from 'react-i18next';
import { Disclosure } from '../../../../components/ui/Disclosure.tsx';
import { SmallTag } from '../../../../components/ui/SmallTag.tsx';
import { formatsFor } from '../../../../i18n/format.ts';
import type { Language } from '../../../../i18n/languages.ts';
import type { FactorSpec, PlannedRun } from '../../../../lib/doe/index.ts';
import { settingMarkOf } from '../../setting-mark.ts';

interface Props {
  readonly factors: readonly FactorSpec[];
  readonly runs: readonly PlannedRun[];
}

const mostTags = 4;
const mostSettings = 5;

/** The runs of a plan as small tags with the shop's own names: a few in view, all when opened. */
export function PlanRack({ factors, runs }: Props) {
  const { t, i18n } = useTranslation('wizard-plan');
  const { number, list } = formatsFor(i18n.language as Language, 'UTC');

  const tag = (run: PlannedRun) => {
    const settings = factors.slice(0, mostSettings).map((factor, place) => ({
      name: factor.name,
      mark: settingMarkOf(factor, run.coded[place] ?? 0),
    }));
    const spoken = factors.map((factor, place) => {
      const value = run.actual[place] ?? '';
      return `${factor.name} ${typeof value === 'number' ? number(value) : value}`;
    });
    const name = t('plan.tag', { number: run.order, settings: list(spoken) });
    return <SmallTag key={run.order} number={String(run.order)} name={name} settings={settings} />;
  };
  return (
    <div className="grid gap-1">
      <div className="small-rack">{runs.slice(0, mostTags).map(tag)}</div>
      {runs.length > mostTags && (
        <Disclosure summary={t('plan.moreRuns', { count: runs.length - mostTags })}>
          <div className="small-rack">{runs.slice(mostTags).map(tag)}</div>
        </Disclosure>
      )}
    </div>
  );
}
