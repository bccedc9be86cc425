import { type ReactNode, useState } from 'react';
import { useTranslation } from 'react-i18next';
import { Button } from '../../components/ui/Button.tsx';

interface Props {
  readonly label: string;
  readonly help?: ReactNode;
  readonly value: string | null;
  /** Said where there is no value. */
  readonly missing: string;
}

/** A value to be carried over to another program, with a button that copies it. */
export function CopyLine({ label, help, value, missing }: Props) {
  const { t } = useTranslation('shop');
  const [copied, setCopied] = useState(false);

  async function copy(text: string): Promise<void> {
    await navigator.clipboard.writeText(text);
    setCopied(true);
  }

  return (
    <div>
      <p className="field-label">{label}</p>
      {help && <p className="field-help">{help}</p>}
      {value === null ? (
        <p>{missing}</p>
      ) : (
        <div className="flex flex-wrap items-center gap-3">
          <code className="figures min-w-0 break-all">{value}</code>
          <Button icon={copied ? 'tick' : 'copy'} onClick={() => copy(value)}>
            {copied ? t('check.copied') : t('check.copy')}
          </Button>
        </div>
      )}
    </div>
  );
}
