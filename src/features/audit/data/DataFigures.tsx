import { Disclosure } from '../../../components/ui/Disclosure.tsx';
import type { AuditDataView, AuditRun } from '../audit-data-view.ts';
import type { AuditWording } from '../audit-wording.ts';
import { AuditPart } from '../frame/AuditPart.tsx';
import { ReadingsTable } from './ReadingsTable.tsx';
import { SettingsTable } from './SettingsTable.tsx';
import { StepsTable } from './StepsTable.tsx';

interface Props extends AuditWording {
  readonly data: AuditDataView;
}

function Talk({ run, t, formats }: Pick<Props, 't' | 'formats'> & { readonly run: AuditRun }) {
  return (
    <Disclosure summary={t('audit:data.talkOf', { run: run.number, size: run.texts.length })}>
      <ul className="audit-talk">
        {run.texts.map(({ kind, at, who, words, state }) => (
          <li key={`${kind} ${at} ${words}`}>
            <span className="text-steel">
              {[
                formats.dateTime(at),
                t(`audit:data.talk.${kind}`),
                who ?? '',
                state ? t(`audit:data.textStates.${state}`) : '',
              ]
                .filter((part) => part !== '')
                .join(' \u00b7 ')}
            </span>
            <br />
            <span className="whitespace-pre-line">{words}</span>
          </li>
        ))}
      </ul>
    </Disclosure>
  );
}

/** What was set, made, measured and said: the whole history, nothing taken out. */
export function DataFigures({ data, ...wording }: Props) {
  const { t, formats } = wording;
  const talked = data.runs.filter(({ texts }) => texts.length > 0);
  return (
    <>
      <AuditPart id="settings" title={t('audit:data.settings')} note={t('audit:data.settingsNote')}>
        <SettingsTable data={data} {...wording} />
      </AuditPart>
      <AuditPart id="readings" title={t('audit:data.readings')} note={t('audit:data.readingsNote')}>
        <ReadingsTable data={data} {...wording} />
      </AuditPart>
      <AuditPart
        id="steps"
        title={t('audit:data.steps')}
        note={data.showsNames ? undefined : t('audit:data.namesHidden')}
      >
        <StepsTable data={data} {...wording} />
      </AuditPart>
      <AuditPart id="stretches" title={t('audit:data.stretches')}>
        <ul className="audit-lines">
          {data.stretches.map(({ n, kind, words, at }) => (
            <li key={n}>
              {[String(n), t(`audit:data.stretchKinds.${kind}`), words, formats.dateTime(at)]
                .filter((part) => part !== '')
                .join(' \u00b7 ')}
            </li>
          ))}
        </ul>
      </AuditPart>
      <AuditPart id="texts" title={t('audit:data.texts')}>
        {talked.length === 0 && <p>{t('audit:data.noTexts')}</p>}
        {talked.map((run) => (
          <Talk key={run.id} run={run} t={t} formats={formats} />
        ))}
      </AuditPart>
    </>
  );
}
