import type { ResourceLanguage } from 'i18next';
import { useState } from 'react';
import { useTranslation } from 'react-i18next';
import { IslandRoot } from '../../components/island/IslandRoot.tsx';
import { useSubmission } from '../../components/island/use-submission.ts';
import { Button } from '../../components/ui/Button.tsx';
import { TextInput } from '../../components/ui/TextInput.tsx';
import { formatsFor } from '../../i18n/format.ts';
import type { Language } from '../../i18n/languages.ts';
import { FaultCallout } from '../people/FaultCallout.tsx';
import type { PublicShare } from './share.schema.ts';
import { endShareCall, shareVerdictCall } from './verdict.queries.ts';

interface Props {
  readonly language: Language;
  readonly words: ResourceLanguage;
  readonly timeZone: string;
  readonly trialId: string;
  /** The links that open now. */
  readonly shares: readonly PublicShare[];
}

/** Links by which a boss may read the verdict: made, seen and ended here. */
export function ShareBox({ words, ...rest }: Props) {
  return (
    <IslandRoot language={rest.language} words={words}>
      <ShareParts {...rest} />
    </IslandRoot>
  );
}

function ShareParts({ language, timeZone, trialId, shares }: Omit<Props, 'words'>) {
  const { t } = useTranslation('verdict-page');
  const formats = formatsFor(language, timeZone);
  const [open, setOpen] = useState(shares);
  const [address, setAddress] = useState<string | null>(null);
  const [copied, setCopied] = useState(false);
  const { busy, fault, submit } = useSubmission();
  const make = () =>
    submit(async () => {
      const { address: made, ...share } = await shareVerdictCall(trialId);
      setAddress(made);
      setCopied(false);
      setOpen((before) => [share, ...before]);
    });
  const end = (id: string) =>
    submit(async () => {
      await endShareCall(trialId, id);
      if (open[0]?.id === id) setAddress(null);
      setOpen((before) => before.filter((share) => share.id !== id));
    });
  return (
    <section className="sheet verdict-decide" aria-labelledby="share">
      <h2 id="share">{t('share.title')}</h2>
      <p>{t('share.words')}</p>
      {address !== null && (
        <>
          <TextInput
            id="share-address"
            label={t('share.address')}
            help={t('share.once')}
            value={address}
            readOnly
            onFocus={(event) => event.currentTarget.select()}
          />
          <div className="button-row">
            <Button
              icon="copy"
              onClick={async () => {
                await navigator.clipboard.writeText(address);
                setCopied(true);
              }}
            >
              {copied ? t('boss.copied') : t('share.copy')}
            </Button>
          </div>
        </>
      )}
      {open.length > 0 && (
        <ul className="verdict-shares">
          {open.map(({ id, madeAt, endsAt }) => (
            <li key={id}>
              <span>{t('share.line', { made: formats.dateTime(madeAt), end: formats.date(endsAt) })}</span>
              <Button icon="remove" onClick={() => end(id)}>
                {t('share.end')}
                <span className="sr-only"> {formats.dateTime(madeAt)}</span>
              </Button>
            </li>
          ))}
        </ul>
      )}
      <FaultCallout fault={fault} />
      <div className="button-row">
        <Button icon="link" busy={busy} busyLabel={t('decide.saving')} onClick={make}>
          {t('share.make')}
        </Button>
      </div>
    </section>
  );
}
