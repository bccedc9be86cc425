import { compareTerms } from '../../../lib/doe/index.ts';
import type { AuditWording } from '../audit-wording.ts';
import { FigureTable, figureColumn } from '../table/FigureTable.tsx';
import type { ModelsView } from './compared-model.ts';

interface Props extends AuditWording {
  readonly view: ModelsView;
}

interface Row {
  term: string;
}

/** Every term with its effect and its p in each model; each on the scale of its own analysis. */
export function SideBySideTable({ view, ...wording }: Props) {
  const { t, figures } = wording;
  const { models } = view;
  const terms = new Set(models.flatMap(({ analysis }) => analysis?.terms.map(({ term }) => term) ?? []));
  const rows: Row[] = [...terms].sort(compareTerms).map((term) => ({ term }));
  return (
    <FigureTable<Row>
      id="side-by-side-table"
      caption={t('audit-models:sideBySide')}
      columns={[
        { key: 'term', header: t('audit-model:terms.term'), rowHeader: true, cell: ({ term }) => term },
        ...models.flatMap(({ id, name, analysis }) => {
          const named = id === null ? t('audit-models:ownName') : name;
          const estimate = ({ term }: Row) => analysis?.terms.find((each) => each.term === term);
          return [
            figureColumn<Row>(
              {
                key: `effect-${id}`,
                header: t('audit-models:effectIn', { name: named }),
                rows,
                value: (row) => estimate(row)?.effect ?? null,
              },
              wording,
            ),
            figureColumn<Row>(
              {
                key: `p-${id}`,
                header: t('audit-models:pIn', { name: named }),
                rows,
                value: (row) => estimate(row)?.p ?? null,
                write: figures.p,
              },
              wording,
            ),
          ];
        }),
      ]}
      rows={rows}
      rowKey={({ term }) => term}
      {...wording}
    />
  );
}
