import { type CellText, sortPlaces, toTabs } from './table-text.ts';

type Direction = 'ascending' | 'descending';
const iconPlaces = { none: 0, ascending: 1, descending: 2 } as const;

function readCell(cell: Element): CellText {
  const figure = cell.querySelector('data');
  const moment = cell.querySelector('time');
  return {
    words: (cell.textContent ?? '').trim(),
    figure: figure && figure.value !== '' ? Number(figure.value) : null,
    exact: figure?.value ?? moment?.dateTime ?? null,
  };
}

function readRow(row: Element): CellText[] {
  return [...row.children].map(readCell);
}

function sortBy(table: HTMLTableElement, column: number, direction: Direction): void {
  const body = table.querySelector('tbody');
  if (!body) return;
  const rows = [...body.querySelectorAll('tr')];
  const order = sortPlaces(
    rows.map((row) => readRow(row)[column] ?? { words: '', figure: null, exact: null }),
    direction,
  );
  body.append(...order.flatMap((place) => rows[place] ?? []));
}

/** Turns each column's name into a button that sorts by it; the same again turns the order round. */
function makeSortable(table: HTMLTableElement, icons: readonly Element[]): void {
  const headers = [...table.querySelectorAll<HTMLTableCellElement>('thead th')];
  const mark = (header: Element, state: keyof typeof iconPlaces) => {
    header.querySelector('.icon')?.remove();
    const icon = icons[iconPlaces[state]]?.cloneNode(true);
    if (icon) header.querySelector('.table-sort')?.append(icon);
  };
  for (const [column, header] of headers.entries()) {
    const button = document.createElement('button');
    button.type = 'button';
    button.className = 'table-sort';
    button.append(...header.childNodes);
    header.replaceChildren(button);
    header.classList.add('table-sortable');
    mark(header, 'none');
    button.addEventListener('click', () => {
      const direction: Direction =
        header.getAttribute('aria-sort') === 'ascending' ? 'descending' : 'ascending';
      for (const other of headers) {
        other.removeAttribute('aria-sort');
        mark(other, 'none');
      }
      header.setAttribute('aria-sort', direction);
      mark(header, direction);
      sortBy(table, column, direction);
    });
  }
}

/** The header's words and every row as they stand, for a spreadsheet. */
function textOf(table: HTMLTableElement, decimalMark: string): string {
  const words = [...table.querySelectorAll('thead th')].map(({ textContent }) => (textContent ?? '').trim());
  const rows = [...table.querySelectorAll('tbody tr')].map(readRow);
  return toTabs(words, rows, decimalMark);
}

/** Makes the tables of a page sortable and copyable, once each. */
export function enhanceTables(page: ParentNode): void {
  for (const frame of page.querySelectorAll<HTMLElement>('[data-figure-table]')) {
    const table = frame.querySelector('table');
    const button = frame.querySelector<HTMLButtonElement>('[data-copy-table]');
    if (!table || !button?.hidden) continue;
    if (table.querySelector('.table-empty')) continue;
    const icons = frame.querySelector<HTMLTemplateElement>('[data-sort-icons]')?.content.children ?? [];
    makeSortable(table, [...icons]);
    button.hidden = false;
    button.addEventListener('click', async () => {
      await navigator.clipboard.writeText(textOf(table, frame.dataset['decimalMark'] ?? '.'));
      const said = button.nextElementSibling;
      if (said) said.textContent = button.dataset['copyTable'] ?? '';
    });
  }
}
