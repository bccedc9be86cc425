import { useTranslation } from 'react-i18next';
import { Callout } from '../../../../components/ui/Callout.tsx';
import type { TextsPreview } from '../../texts-preview.schema.ts';

interface Props {
  readonly text: TextsPreview['texts'][number];
}

/** One text as the phone shows it, its length, and which name to shorten where it is too long. */
export function TextCard({ text }: Props) {
  const { t } = useTranslation('wizard-plan');
  const { body, language, units, sevenBit, segments, tooLong } = text;
  const length = {
    letters: t('texts.letters', { count: units }),
    segments: t('texts.segments', { count: segments }),
  };
  return (
    <div className="grid gap-2">
      <p className="text-bubble" lang={language} translate="no">
        {body}
      </p>
      <p className="text-steel">{sevenBit ? t('texts.plain', length) : t('texts.marked', length)}</p>
      {tooLong && (
        <Callout tone="caution" title={t('texts.tooLong')}>
          {t('texts.shorten', { name: tooLong.name, count: tooLong.letters })}
        </Callout>
      )}
    </div>
  );
}
