import { Table, type TableColumn } from '../../components/ui/Table.tsx';
import type { Formats } from '../../i18n/format.ts';
import type { Translate } from '../../i18n/translator.ts';
import type { ActivityLine } from './activity.schema.ts';
import { describeDetails, describeKind } from './activity.ts';

interface Props {
  readonly lines: readonly ActivityLine[];
  readonly t: Translate;
  readonly formats: Formats;
}

/** The log, line by line, as it was written: who, what, when, with its figures and codes. */
export function ActivityTable({ lines, t, formats }: Props) {
  const columns: TableColumn<ActivityLine>[] = [
    {
      key: 'when',
      header: t('shop:activity.when'),
      cell: ({ at }) => <span className="figures whitespace-nowrap">{formats.dateTime(at)}</span>,
    },
    {
      key: 'who',
      header: t('shop:activity.who'),
      cell: ({ actor }) => actor.name ?? t(`shop:activity.actor.${actor.kind}`),
    },
    {
      key: 'what',
      header: t('shop:activity.what'),
      rowHeader: true,
      cell: ({ kind }) => describeKind(kind, t),
    },
    { key: 'about', header: t('shop:activity.about'), cell: ({ subject }) => subject },
    {
      key: 'details',
      header: t('shop:activity.details'),
      cell: ({ details }) => <code className="text-small break-words">{describeDetails(details)}</code>,
    },
  ];
  return (
    <Table
      id="activity"
      caption={t('shop:activity.title')}
      captionHidden
      close
      columns={columns}
      rows={lines}
      rowKey={({ seq }) => String(seq)}
      empty={t('shop:activity.empty')}
    />
  );
}
