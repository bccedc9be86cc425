import { useTranslation } from 'react-i18next';
import { Table, type TableColumn } from '../../../components/ui/Table.tsx';
import type { Formats } from '../../../i18n/format.ts';
import { machineAddress } from '../../verdict/machine-history.ts';
import type { ListTrials, PublicTrial } from '../trial.schema.ts';
import { trialAddress } from '../trial-address.ts';
import { sortedTrialsAddress } from '../trials-address.ts';
import { TrialActions, type TrialMoves } from './TrialActions.tsx';
import { TrialStateMark } from './TrialStateMark.tsx';

interface Props {
  readonly trials: readonly PublicTrial[];
  readonly list: ListTrials;
  readonly formats: Formats;
  /** Null for a reader who may only look. */
  readonly moves: TrialMoves | null;
}

/** The trials where there is room for a table. */
export function TrialsTable({ trials, list, formats, moves }: Props) {
  const { t } = useTranslation('trials');
  const columns: TableColumn<PublicTrial>[] = [
    {
      key: 'number',
      header: t('column.number'),
      figures: true,
      sortHref: sortedTrialsAddress(list, 'number'),
      cell: ({ number }) => number,
    },
    {
      key: 'title',
      header: t('column.title'),
      rowHeader: true,
      sortHref: sortedTrialsAddress(list, 'title'),
      cell: (trial) => (
        <a className="wrap-anywhere" href={trialAddress(trial)}>
          {trial.title || t('untitled')}
        </a>
      ),
    },
    {
      key: 'machine',
      header: t('column.machine'),
      sortHref: sortedTrialsAddress(list, 'machine'),
      cell: ({ machine }) =>
        machine !== '' && (
          <a className="wrap-anywhere" href={machineAddress(machine)}>
            {machine}
          </a>
        ),
    },
    { key: 'state', header: t('column.state'), cell: ({ state }) => <TrialStateMark state={state} /> },
    { key: 'who', header: t('column.who'), cell: ({ ownerName }) => ownerName },
    {
      key: 'changed',
      header: t('column.changed'),
      sortHref: sortedTrialsAddress(list, 'changed'),
      cell: ({ updatedAt }) => (
        <time className="figures whitespace-nowrap" dateTime={new Date(updatedAt).toISOString()}>
          {formats.dateTime(updatedAt)}
        </time>
      ),
    },
  ];
  if (moves) {
    columns.push({
      key: 'actions',
      header: <span className="sr-only">{t('column.actions')}</span>,
      cell: (trial) => <TrialActions trial={trial} moves={moves} />,
    });
  }
  return (
    <Table
      id="trials"
      caption={t('table')}
      captionHidden
      columns={columns}
      rows={trials}
      rowKey={({ id }) => id}
      empty={t('noneFound')}
      sort={{ key: list.sort, direction: list.direction }}
    />
  );
}
