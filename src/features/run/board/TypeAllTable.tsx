import type { ClipboardEvent } from 'react';
import { useTranslation } from 'react-i18next';
import { Table } from '../../../components/ui/Table.tsx';
import type { BoardRun } from '../board.schema.ts';
import { useBoardTools } from './board-context.tsx';
import { tagSettings } from './board-view.tsx';
import { type FigureField, typedFigures } from './typed-figures.ts';

interface Props {
  readonly runs: readonly BoardRun[];
  readonly fields: readonly FigureField[];
  /** By run, then by field. */
  readonly typed: Readonly<Record<string, Readonly<Record<string, string>>>>;
  /** A sentence for each run that was not kept. */
  readonly faults: Readonly<Record<string, string>>;
  readonly onType: (runId: string, key: string, text: string) => void;
  readonly onPaste: (event: ClipboardEvent, at: { row: number; column: number }) => void;
}

/** A row for each open run, a column for each figure. */
export function TypeAllTable({ runs, fields, typed, faults, onType, onPaste }: Props) {
  const { t } = useTranslation('board');
  const { board, formats } = useBoardTools();
  const headerOf = ({ item, part }: FigureField) => {
    const name = item.lot === null ? item.name : t('outOf', { name: item.name, lot: item.lot });
    return item.parts > 1 ? t('namedPart', { name, part }) : name;
  };
  return (
    <Table
      id="type-all"
      caption={t('typeAll')}
      captionHidden
      rows={runs}
      rowKey={({ id }) => id}
      empty=""
      columns={[
        { key: 'run', header: t('runs'), rowHeader: true, cell: ({ number }) => number },
        {
          key: 'settings',
          header: t('settings'),
          cell: (run) => (
            <>
              {tagSettings(board, run, formats)
                .map(({ name, value }) => `${name} ${value}`)
                .join(', ')}
              {faults[run.id] && (
                <span id={`fault-${run.id}`} className="field-error" role="alert">
                  {faults[run.id]}
                </span>
              )}
            </>
          ),
        },
        ...fields.map((field, column) => ({
          key: field.key,
          header: headerOf(field),
          cell: (run: BoardRun) => (
            <input
              type="text"
              inputMode="decimal"
              autoComplete="off"
              className="input input-number board-cell"
              aria-label={t('cell', { run: run.number, name: headerOf(field) })}
              aria-describedby={faults[run.id] ? `fault-${run.id}` : undefined}
              value={typed[run.id]?.[field.key] ?? typedFigures(run)[field.key] ?? ''}
              onChange={(event) => onType(run.id, field.key, event.target.value)}
              onPaste={(event) => onPaste(event, { row: runs.indexOf(run), column })}
            />
          ),
        })),
      ]}
    />
  );
}
