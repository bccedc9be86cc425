import { render, screen, within } from '@testing-library/react';
import { userEvent } from '@testing-library/user-event';
import { beforeEach, describe, expect, it, vi } from 'vitest';
import { translatorFor } from '../../../i18n/translator.ts';
import { auditFiguresFor } from '../audit-wording.ts';
import { enhanceTables } from './enhance-tables.ts';
import { FigureTable, figureColumn } from './FigureTable.tsx';

interface Row {
  term: string;
  effect: number | null;
}

const rows: Row[] = [
  { term: 'A', effect: 2 / 3 },
  { term: '=B', effect: -10.25 },
  { term: 'C', effect: null },
  { term: 'D', effect: 3 },
];
const copied = vi.fn(async (_text: string) => undefined);

function show(language: 'en' | 'pl'): void {
  const figures = auditFiguresFor(language);
  const wording = { t: translatorFor('en'), figures };
  render(
    <FigureTable
      id="effects"
      caption="Effects"
      columns={[
        { key: 'term', header: 'Term', rowHeader: true, cell: ({ term }: Row) => term },
        figureColumn({ key: 'effect', header: 'Effect', rows, value: ({ effect }) => effect }, wording),
      ]}
      rows={rows}
      rowKey={({ term }) => term}
      {...wording}
    />,
  );
  enhanceTables(document);
}

const order = () => screen.getAllByRole('rowheader').map(({ textContent }) => textContent);

beforeEach(() => {
  copied.mockClear();
  vi.stubGlobal('navigator', { ...navigator, clipboard: { writeText: copied } });
});

describe('a table of figures', () => {
  it('is sorted by its headers with the keyboard alone, empty cells last', async () => {
    show('en');
    const header = screen.getByRole('columnheader', { name: 'Effect' });
    within(header).getByRole('button').focus();
    await userEvent.keyboard('{Enter}');
    expect(order()).toEqual(['=B', 'A', 'D', 'C']);
    expect(header).toHaveAttribute('aria-sort', 'ascending');
    await userEvent.keyboard(' ');
    expect(order()).toEqual(['D', 'A', '=B', 'C']);
    expect(header).toHaveAttribute('aria-sort', 'descending');
    await userEvent.click(screen.getByRole('button', { name: 'Term' }));
    expect(header).not.toHaveAttribute('aria-sort');
  });

  it.each([
    ['en', '.', '0.6666'],
    ['pl', ',', '0,6666'],
  ] as const)('is copied with all its digits and the decimal mark of %s', async (language, mark, digits) => {
    show(language);
    await userEvent.click(screen.getByRole('button', { name: /^Copy table/ }));
    const text = copied.mock.calls[0]?.[0] ?? '';
    expect(text).toBe(`Term\tEffect\nA\t${String(2 / 3).replace('.', mark)}\n'=B\t-10${mark}25\nC\t\nD\t3`);
    expect(text).toContain(digits);
    expect(screen.getByText('Copied with all digits.')).toBeVisible();
  });
});
