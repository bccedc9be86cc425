import { useTranslation } from 'react-i18next';
import { Table, type TableColumn } from '../../../components/ui/Table.tsx';
import { formatsFor } from '../../../i18n/format.ts';
import type { Language } from '../../../i18n/languages.ts';
import type { PublicPlan, PublicRun } from '../plan.schema.ts';
import { useReview } from './review-context.tsx';

interface Props {
  readonly plan: PublicPlan;
  /** Of the settings, in the order of the letters. */
  readonly names: readonly string[];
}

/** Every run in the order in which it will be made, with what the dials are set to. */
export function RunOrder({ plan, names }: Props) {
  const { t, i18n } = useTranslation('plan-review');
  const { shop } = useReview();
  const { number } = formatsFor(i18n.language as Language, shop.timeZone);
  const { runs } = plan;
  const columns: TableColumn<PublicRun>[] = [
    {
      key: 'run',
      header: t('audit.column.run'),
      cell: ({ order, center }) => `${order}${center ? ` ${t('audit.center')}` : ''}`,
      rowHeader: true,
    },
    ...(plan.proposal.blocks > 1
      ? [
          {
            key: 'block',
            header: t('audit.column.block'),
            cell: ({ block }: PublicRun) => block,
            figures: true,
          },
        ]
      : []),
    ...(plan.proposal.wholePlots === undefined
      ? []
      : [
          {
            key: 'plot',
            header: t('audit.column.plot'),
            cell: ({ wholePlot }: PublicRun) => wholePlot,
            figures: true,
          },
        ]),
    ...names.map((name, place) => ({
      key: `setting-${place}`,
      header: name,
      cell: ({ planned }: PublicRun) => {
        const value = planned[place] ?? '';
        return typeof value === 'number' ? number(value) : value;
      },
      figures: true,
    })),
  ];
  return (
    <Table
      id="run-order"
      caption={t('audit.order')}
      captionHidden
      columns={columns}
      rows={runs}
      rowKey={({ order }) => String(order)}
      empty={t('nothing')}
      close
    />
  );
}
