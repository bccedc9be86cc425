import { Callout } from '../../../components/ui/Callout.tsx';
import { Table } from '../../../components/ui/Table.tsx';
import type { Formats } from '../../../i18n/format.ts';
import type { Translate } from '../../../i18n/translator.ts';
import { trialAddress } from '../../trial/trial-address.ts';
import type { MachineHistory } from '../machine-history.ts';

interface Props {
  readonly history: MachineHistory;
  readonly t: Translate;
  readonly formats: Formats;
}

/** What is set on a machine by its trials, and what came of each of them. */
export function MachineTrials({ history, t, formats }: Props) {
  const { inUse, trials } = history;
  const show = (value: number | string) => (typeof value === 'number' ? formats.number(value, 6) : value);
  return (
    <div className="verdict">
      <section className="sheet verdict-answer" aria-labelledby="in-use">
        <h2 id="in-use">{t('verdict-page:machine.inUse')}</h2>
        {inUse === null ? (
          <p>{t('verdict-page:machine.nothing')}</p>
        ) : (
          <>
            <dl className="verdict-figures">
              {inUse.settings.map(({ name, value, unit }) => (
                <div key={name} className="verdict-figure">
                  <dt translate="no">{name}</dt>
                  <dd>{`${show(value)} ${unit}`.trim()}</dd>
                </div>
              ))}
            </dl>
            <p className="text-steel">
              {t('verdict-page:machine.since', {
                date: formats.date(inUse.since),
                number: formats.number(inUse.number),
              })}
            </p>
            {inUse.unchecked && <Callout tone="caution">{t('verdict-page:cardPage.unchecked')}</Callout>}
            <p>
              <a href={`/trials/${inUse.trialId}/card`}>{t('verdict-page:card')}</a>
            </p>
          </>
        )}
      </section>
      <Table
        id="machine-trials"
        caption={t('verdict-page:machine.trials')}
        columns={[
          {
            key: 'number',
            header: t('trials:column.number'),
            figures: true,
            cell: ({ number }) => formats.number(number),
          },
          {
            key: 'title',
            header: t('trials:column.title'),
            rowHeader: true,
            cell: (trial) => <a href={trialAddress(trial)}>{trial.title || t('trials:untitled')}</a>,
          },
          {
            key: 'outcome',
            header: t('verdict-page:machine.outcome'),
            cell: ({ outcome, state }) =>
              outcome === null ? t(`trials:state.${state}`) : t(`verdict-page:outcome.${outcome}`),
          },
          {
            key: 'at',
            header: t('verdict-page:machine.at'),
            figures: true,
            cell: ({ at }) => formats.date(at),
          },
        ]}
        rows={trials}
        rowKey={({ id }) => id}
        empty={t('verdict-page:machine.empty')}
      />
    </div>
  );
}
