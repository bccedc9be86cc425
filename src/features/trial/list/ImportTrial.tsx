import type { ResourceLanguage } from 'i18next';
import { type ChangeEvent, useState } from 'react';
import { useTranslation } from 'react-i18next';
import type { ServerProblem } from '../../../components/island/call-server.ts';
import { IslandRoot } from '../../../components/island/IslandRoot.tsx';
import { useSubmission } from '../../../components/island/use-submission.ts';
import { buttonClass } from '../../../components/ui/button-class.ts';
import { Callout } from '../../../components/ui/Callout.tsx';
import { Icon } from '../../../components/ui/Icon.tsx';
import type { Language } from '../../../i18n/languages.ts';
import { TrialFault } from '../TrialFault.tsx';
import { importTrialCall } from '../trial.queries.ts';
import { trialAddress } from '../trial-address.ts';

interface Props {
  readonly language: Language;
  readonly words: ResourceLanguage;
}

const mostBytes = 5 * 1024 * 1024;
const shownPlaces = 12;

/** `#/runs/3/readings/0/value` as people count: runs 4 › readings 1 › value. */
function namePlace(pointer: string): string {
  const parts = pointer.slice(2).split('/');
  return parts.reduce((place, part) => {
    if (/^\d+$/.test(part)) return `${place} ${Number(part) + 1}`;
    return place === '' ? part : `${place} › ${part}`;
  }, '');
}

function Places({ problem }: { readonly problem: ServerProblem }) {
  const { t } = useTranslation('trials');
  const more = problem.errors.length - shownPlaces;
  return (
    <Callout tone="caution" title={t('fault.title')} live="assertive">
      <p>{t('import.faults')}</p>
      <ul className="list-disc pl-6">
        {problem.errors.slice(0, shownPlaces).map(({ pointer, code, detail }) => (
          <li key={`${pointer} ${code}`} className="wrap-anywhere">
            <strong>{namePlace(pointer)}</strong> {detail}
          </li>
        ))}
      </ul>
      {more > 0 && <p>{t('import.more', { count: more })}</p>}
    </Callout>
  );
}

function ImportPart() {
  const { t } = useTranslation('trials');
  const { busy, fault, submit, clearFault } = useSubmission();
  const [fileFault, setFileFault] = useState<string | null>(null);
  const problem = fault?.kind === 'refused' ? fault.problem : null;
  const hasPlaces = problem !== null && problem.errors.length > 0;

  async function bringIn({ target }: ChangeEvent<HTMLInputElement>): Promise<void> {
    const [file] = target.files ?? [];
    clearFault();
    setFileFault(file && file.size > mostBytes ? t('import.tooLarge') : null);
    if (file && file.size <= mostBytes) {
      await submit(async () => window.location.assign(trialAddress(await importTrialCall(file))));
    }
    // The same file, put right, may be picked again.
    target.value = '';
  }

  return (
    <div className="grid justify-items-start gap-3">
      <p>{t('import.words')}</p>
      <label
        className={`${buttonClass({})} has-focus-visible:outline-3 has-focus-visible:outline-petrol`}
        aria-busy={busy}
      >
        <Icon name="paper" />
        {busy ? t('import.busy') : t('import.choose')}
        <input
          type="file"
          accept=".json,application/json"
          className="sr-only"
          disabled={busy}
          onChange={bringIn}
        />
      </label>
      {fileFault && (
        <Callout tone="caution" live="assertive">
          {fileFault}
        </Callout>
      )}
      {problem?.code === 'malformed' && (
        <Callout tone="caution" title={t('fault.title')} live="assertive">
          {t('import.unreadable')}
        </Callout>
      )}
      {hasPlaces && <Places problem={problem} />}
      {!hasPlaces && problem?.code !== 'malformed' && <TrialFault fault={fault} />}
    </div>
  );
}

/** Brings in a trial that another shop took out as a file: the whole of it, or nothing with the reasons why. */
export function ImportTrial({ language, words }: Props) {
  return (
    <IslandRoot language={language} words={words}>
      <ImportPart />
    </IslandRoot>
  );
}
