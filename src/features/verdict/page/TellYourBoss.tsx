import { Button } from '../../../components/ui/Button.tsx';
import { bossWords } from './boss-words.ts';
import { Numbered } from './Numbered.tsx';
import type { PageWording } from './page-wording.ts';

/** The button gets its work from the page's script; without one it is not shown. */
export function TellYourBoss(wording: PageWording) {
  const { t } = wording;
  const words = bossWords(wording).join(' ');
  return (
    <Numbered number={5} id="tell-your-boss" title={t('verdict-page:part.boss')}>
      <blockquote id="boss-words" className="verdict-boss">
        {words}
      </blockquote>
      <p>
        <Button icon="copy" hidden data-copy={words} data-copied={t('verdict-page:boss.copied')}>
          {t('verdict-page:boss.copy')}
        </Button>
      </p>
    </Numbered>
  );
}
