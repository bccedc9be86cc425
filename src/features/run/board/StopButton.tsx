import { useTranslation } from 'react-i18next';
import { Button } from '../../../components/ui/Button.tsx';
import { useBoardTools } from './board-context.tsx';

/** One press stops the trial; nothing is asked first. In view wherever the board is, also over an open panel. */
export function StopButton({ onStopped }: { readonly onStopped?: () => void }) {
  const { t } = useTranslation('board');
  const { board, doTrial } = useBoardTools();
  if (!board.events.includes('hold')) return null;

  async function stop(): Promise<void> {
    if (await doTrial({ event: 'hold' })) onStopped?.();
  }
  return (
    <Button kind="stop" size="large" icon="stop" onClick={stop}>
      {t('stop')}
    </Button>
  );
}
