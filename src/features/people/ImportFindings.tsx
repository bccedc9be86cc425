import { useTranslation } from 'react-i18next';
import { Callout } from '../../components/ui/Callout.tsx';
import { Table } from '../../components/ui/Table.tsx';
import { formatsFor } from '../../i18n/format.ts';
import type { Language } from '../../i18n/languages.ts';
import { type ImportPreview, importLimits } from './import.schema.ts';

interface Props {
  readonly preview: ImportPreview;
  readonly language: Language;
}

type Fault = ImportPreview['faults'][number];

/** What a look at the file found: why it cannot be read, each row to mend, or that all is right. */
export function ImportFindings({ preview, language }: Props) {
  const { t } = useTranslation('people');
  const formats = formatsFor(language, 'UTC');
  const { rows, fileFault, faultCount, faults, sample } = preview;

  if (fileFault !== null) {
    return (
      <Callout tone="stop" live="assertive">
        {t(`import.fileFault.${fileFault}`, {
          rows: formats.number(rows),
          limit: formats.number(importLimits.rows),
          parts: formats.number(Math.ceil(rows / importLimits.rows)),
        })}
      </Callout>
    );
  }
  if (faultCount === 0) {
    return (
      <Callout tone="good" live="polite" title={t('import.right', { count: rows })}>
        <p>{t('import.rightWords')}</p>
        <ul>
          {sample.map(({ line, name, phone }) => (
            <li key={line}>
              {name} {phone && <span className="figures">{phone}</span>}
            </li>
          ))}
        </ul>
      </Callout>
    );
  }
  return (
    <>
      <Callout tone="caution" live="assertive" title={t('import.wrong', { count: faultCount })}>
        {t('import.wrongWords')}
      </Callout>
      <Table<Fault>
        id="faults"
        caption={t('import.faults')}
        captionHidden
        columns={[
          { key: 'line', header: t('import.line'), figures: true, cell: ({ line }) => formats.number(line) },
          {
            key: 'reason',
            header: t('import.reason'),
            cell: ({ code, otherLine = 0 }) => t(`import.fault.${code}`, { line: formats.number(otherLine) }),
          },
          { key: 'written', header: t('import.written'), cell: ({ text }) => text },
        ]}
        rows={faults}
        rowKey={({ line, code, text }) => `${line} ${code} ${text}`}
        empty=""
      />
      {faultCount > faults.length && (
        <p>{t('import.more', { number: formats.number(faultCount - faults.length) })}</p>
      )}
    </>
  );
}
