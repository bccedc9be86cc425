import type { ReactNode } from 'react';
import { TableHeader } from './TableHeader.tsx';

export interface TableSort {
  readonly key: string;
  readonly direction: 'ascending' | 'descending';
}

export interface TableColumn<Row> {
  readonly key: string;
  readonly header: ReactNode;
  readonly cell: (row: Row) => ReactNode;
  /** Figures stand at the end of their cell in the face whose digits are equally wide. */
  readonly figures?: boolean | undefined;
  /** Names the row; at most one column. */
  readonly rowHeader?: boolean | undefined;
  /** Where a press on the header leads, for a page without a script. */
  readonly sortHref?: string | undefined;
  /** True in an island that passes `onSort`. */
  readonly sortable?: boolean | undefined;
}

interface TableProps<Row> {
  readonly caption: ReactNode;
  readonly captionHidden?: boolean | undefined;
  /** Unique on the page: names the region that scrolls sideways. */
  readonly id: string;
  readonly columns: readonly TableColumn<Row>[];
  readonly rows: readonly Row[];
  readonly rowKey: (row: Row) => string;
  /** Said in one row across all columns while there are no rows. */
  readonly empty: ReactNode;
  readonly sort?: TableSort | undefined;
  readonly onSort?: ((sort: TableSort) => void) | undefined;
  /** Rows of 36 px for a mouse, 48 for a finger: the engineer's pages. */
  readonly close?: boolean | undefined;
}

function cellClass<Row>(column: TableColumn<Row>): string | undefined {
  return column.figures ? 'table-end table-figures' : undefined;
}

function TableRow<Row>({
  columns,
  row,
}: {
  readonly columns: readonly TableColumn<Row>[];
  readonly row: Row;
}) {
  return (
    <tr>
      {columns.map((column) =>
        column.rowHeader ? (
          <th key={column.key} scope="row" className={cellClass(column)}>
            {column.cell(row)}
          </th>
        ) : (
          <td key={column.key} className={cellClass(column)}>
            {column.cell(row)}
          </td>
        ),
      )}
    </tr>
  );
}

// A region that scrolls sideways must take the keyboard's focus (WCAG 2.1.1): not every browser sees to it by itself.
const scrollsByKeyboard = { tabIndex: 0 };

/** Rows under headers. Where it is wider than the page it scrolls sideways, by finger, wheel or arrow keys. */
export function Table<Row>(props: TableProps<Row>) {
  const { caption, captionHidden, id, columns, rows, rowKey, empty, sort, onSort, close } = props;
  return (
    <section className="table-frame" aria-labelledby={`${id}-caption`} {...scrollsByKeyboard}>
      <table className={close ? 'table table-close' : 'table'}>
        <caption id={`${id}-caption`} className={captionHidden ? 'sr-only' : undefined}>
          {caption}
        </caption>
        <thead>
          <tr>
            {columns.map((column) => (
              <TableHeader key={column.key} column={column} sort={sort} onSort={onSort} />
            ))}
          </tr>
        </thead>
        <tbody>
          {rows.length === 0 ? (
            <tr>
              <td className="table-empty" colSpan={columns.length}>
                <div className="table-empty-words">{empty}</div>
              </td>
            </tr>
          ) : (
            rows.map((row) => <TableRow key={rowKey(row)} columns={columns} row={row} />)
          )}
        </tbody>
      </table>
    </section>
  );
}
