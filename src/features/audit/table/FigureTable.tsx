import type { ReactNode } from 'react';
import { Button } from '../../../components/ui/Button.tsx';
import { Icon } from '../../../components/ui/Icon.tsx';
import { Table, type TableColumn } from '../../../components/ui/Table.tsx';
import type { AuditWording } from '../audit-wording.ts';

interface Props<Row> extends Pick<AuditWording, 't' | 'figures'> {
  /** Unique on the page. */
  readonly id: string;
  readonly caption: string;
  readonly columns: readonly TableColumn<Row>[];
  readonly rows: readonly Row[];
  readonly rowKey: (row: Row) => string;
  readonly empty?: ReactNode;
  /** Where the heading above does not say it already. */
  readonly showsCaption?: boolean;
}

/** A table of the audit. With a script its columns sort and it copies into a spreadsheet with all digits; without, it is read. */
export function FigureTable<Row>({ t, figures, empty, showsCaption = false, ...table }: Props<Row>) {
  return (
    <div className="figure-table" data-figure-table="" data-decimal-mark={figures.decimalMark}>
      <Table {...table} captionHidden={!showsCaption} empty={empty ?? t('audit:table.empty')} close />
      <p className="figure-table-foot no-print">
        <Button hidden icon="copy" data-copy-table={t('audit:table.copied')}>
          {t('audit:table.copy')}
          <span className="sr-only"> {table.caption}</span>
        </Button>
        <span role="status" className="text-steel" />
      </p>
      {/* What the script puts beside a column's name: not sorted, ascending, descending. */}
      <template data-sort-icons="">
        <Icon name="sort" size={16} />
        <Icon name="sort-up" size={16} />
        <Icon name="sort-down" size={16} />
      </template>
    </div>
  );
}

interface FigureColumn<Row> {
  readonly key: string;
  readonly header: ReactNode;
  readonly rows: readonly Row[];
  readonly value: (row: Row) => number | null;
  /** Unless told, decimals alike for the whole column. */
  readonly write?: ((value: number) => string) | undefined;
}

/** A column of figures: rounded to the eye, whole in `<data>` for sorting and copying. */
export function figureColumn<Row>(
  column: FigureColumn<Row>,
  { figures }: Pick<AuditWording, 'figures'>,
): TableColumn<Row> {
  const { key, header, rows, value } = column;
  const write = column.write ?? figures.column(rows.map(value));
  return {
    key,
    header,
    figures: true,
    cell: (row) => {
      const figure = value(row);
      if (figure === null) return <data value="">{'\u2013'}</data>;
      return <data value={String(figure)}>{write(figure)}</data>;
    },
  };
}

/** A column of counts and numbers of runs, which have no decimals. */
export function wholeColumn<Row>(
  column: Omit<FigureColumn<Row>, 'write'>,
  wording: Pick<AuditWording, 'figures'>,
): TableColumn<Row> {
  return figureColumn({ ...column, write: wording.figures.tick }, wording);
}
