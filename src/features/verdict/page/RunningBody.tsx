import { Callout } from '../../../components/ui/Callout.tsx';
import { Table, type TableColumn } from '../../../components/ui/Table.tsx';
import type { Formats } from '../../../i18n/format.ts';
import type { Translate } from '../../../i18n/translator.ts';
import { meanOfParts } from '../../../lib/doe/index.ts';
import { resultWords } from '../result-words.ts';
import { sayRunningFact } from '../running-words.ts';
import type { RunningView, ViewedRun } from '../verdict-view.ts';

interface Props {
  readonly view: RunningView;
  readonly t: Translate;
  readonly formats: Formats;
}

const ends = ['failed', 'beyondGauge', 'notRun'] as const;

/** The readings so far in running order; no effect and no ranking, and why. */
export function RunningBody({ view, t, formats }: Props) {
  const { figure, spec } = resultWords({ view, t, formats });
  const say = (run: ViewedRun): string => {
    const [main = []] = run.readings;
    const end = ends.find((known) => known === run.end);
    if (main.length === 0)
      return end === 'failed' || end === 'beyondGauge'
        ? t(`verdict-page:end.${end}`)
        : t('verdict-page:running.waiting');
    const mean = meanOfParts(main);
    return figure(spec.kind === 'rejects' ? mean / (spec.lotSize ?? 1) : mean, { manner: 'fine' });
  };
  const columns: TableColumn<ViewedRun>[] = [
    {
      key: 'run',
      header: t('verdict-page:running.run'),
      cell: (run) => formats.number(run.number),
      rowHeader: true,
    },
    { key: 'reading', header: t('verdict-page:running.reading'), cell: say, figures: true },
  ];
  const read = view.runs.filter(({ readings }) => (readings[0]?.length ?? 0) > 0).length;
  return (
    <div className="verdict">
      <p>{t('verdict-page:running.note', { count: read, planned: view.plannedRuns })}</p>
      <Callout tone="info">{t('verdict-page:running.why')}</Callout>
      {view.facts.map((fact) => (
        <p key={fact.kind + (fact.refs.runs ?? []).join()}>{sayRunningFact(fact, { view, t, formats })}</p>
      ))}
      <Table
        id="readings"
        caption={t('verdict-page:running.readings')}
        columns={columns}
        rows={view.runs}
        rowKey={(run) => String(run.order)}
        empty={t('verdict-page:running.none')}
      />
    </div>
  );
}
