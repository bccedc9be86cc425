import { render, screen, within } from '@testing-library/react';
import { userEvent } from '@testing-library/user-event';
import { useState } from 'react';
import { describe, expect, it } from 'vitest';
import { Table, type TableColumn, type TableSort } from './Table.tsx';

interface Run {
  run: string;
  strength: string;
}
const runs: Run[] = [
  { run: '1', strength: '36.1' },
  { run: '2', strength: '41.5' },
];
const columns: TableColumn<Run>[] = [
  { key: 'run', header: 'Run', cell: (row) => row.run, rowHeader: true, sortable: true },
  { key: 'strength', header: 'Strength, N', cell: (row) => row.strength, figures: true, sortable: true },
];

function SortedTable() {
  const [sort, setSort] = useState<TableSort>({ key: 'run', direction: 'ascending' });
  const rows = runs.toSorted((a, b) => {
    const key = sort.key as keyof Run;
    return (sort.direction === 'ascending' ? 1 : -1) * a[key].localeCompare(b[key]);
  });
  return (
    <Table
      id="runs"
      caption="Runs so far"
      columns={columns}
      rows={rows}
      rowKey={(row) => row.run}
      empty="No run yet."
      sort={sort}
      onSort={setSort}
    />
  );
}

describe('Table', () => {
  it('is named by its caption and can be reached to scroll sideways', async () => {
    render(<SortedTable />);
    expect(screen.getByRole('table', { name: 'Runs so far' })).toBeVisible();
    await userEvent.tab();
    expect(screen.getByRole('region', { name: 'Runs so far' })).toHaveFocus();
  });

  it('names rows and columns', () => {
    render(<SortedTable />);
    expect(screen.getAllByRole('columnheader').map((header) => header.textContent)).toEqual([
      'Run',
      'Strength, N',
    ]);
    expect(screen.getByRole('rowheader', { name: '2' })).toBeVisible();
  });

  it('is sorted by keyboard, says how, and turns round when pressed again', async () => {
    render(<SortedTable />);
    const header = screen.getByRole('columnheader', { name: 'Strength, N' });
    expect(header).not.toHaveAttribute('aria-sort');
    within(header).getByRole('button').focus();
    await userEvent.keyboard('{Enter}');
    expect(header).toHaveAttribute('aria-sort', 'ascending');
    await userEvent.keyboard('{Enter}');
    expect(header).toHaveAttribute('aria-sort', 'descending');
    expect(screen.getAllByRole('rowheader').map((cell) => cell.textContent)).toEqual(['2', '1']);
    expect(screen.getByRole('columnheader', { name: 'Run' })).not.toHaveAttribute('aria-sort');
  });

  it('sorts by links where there is no script', () => {
    const linked = columns.map((column) => ({ ...column, sortHref: `?sort=${column.key}` }));
    render(
      <Table id="t" caption="Runs" columns={linked} rows={runs} rowKey={(row) => row.run} empty="None" />,
    );
    expect(screen.getByRole('link', { name: 'Run' })).toHaveAttribute('href', '?sort=run');
    expect(screen.queryByRole('button')).toBeNull();
  });

  it('has no sort control without somebody to sort', () => {
    render(
      <Table id="t" caption="Runs" columns={columns} rows={runs} rowKey={(row) => row.run} empty="None" />,
    );
    expect(screen.queryByRole('button')).toBeNull();
  });

  it('says in one row across all columns that there is nothing yet', () => {
    render(
      <Table
        id="t"
        caption="Runs"
        columns={columns}
        rows={[]}
        rowKey={() => ''}
        empty="No run has gone out yet."
      />,
    );
    expect(screen.getByRole('cell', { name: 'No run has gone out yet.' })).toHaveAttribute('colspan', '2');
  });
});
