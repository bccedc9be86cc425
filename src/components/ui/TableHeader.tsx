import type { ReactNode } from 'react';
import { Icon } from './Icon.tsx';
import type { TableSort } from './Table.tsx';

interface TableHeaderProps {
  readonly column: {
    readonly key: string;
    readonly header: ReactNode;
    readonly figures?: boolean | undefined;
    readonly sortHref?: string | undefined;
    readonly sortable?: boolean | undefined;
  };
  readonly sort: TableSort | undefined;
  readonly onSort: ((sort: TableSort) => void) | undefined;
}

/** The same column again turns it round; another column starts ascending. */
export function nextSort(key: string, sort: TableSort | undefined): TableSort {
  const turn = sort?.key === key && sort.direction === 'ascending';
  return { key, direction: turn ? 'descending' : 'ascending' };
}

const sortIcons = { ascending: 'sort-up', descending: 'sort-down', none: 'sort' } as const;

/** A column's name; where the column can be sorted, a button (island) or a link (page) that does it. */
export function TableHeader({ column, sort, onSort }: TableHeaderProps) {
  const direction = sort?.key === column.key ? sort.direction : undefined;
  const icon = <Icon name={sortIcons[direction ?? 'none']} size={16} />;
  const canSort = Boolean(column.sortHref) || Boolean(column.sortable && onSort);
  const className = [column.figures && 'table-end', canSort && 'table-sortable'].filter(Boolean).join(' ');

  return (
    <th scope="col" className={className || undefined} aria-sort={direction}>
      {!canSort && column.header}
      {column.sortHref !== undefined && (
        <a className="table-sort" href={column.sortHref}>
          {column.header}
          {icon}
        </a>
      )}
      {column.sortHref === undefined && canSort && (
        <button type="button" className="table-sort" onClick={() => onSort?.(nextSort(column.key, sort))}>
          {column.header}
          {icon}
        </button>
      )}
    </th>
  );
}
