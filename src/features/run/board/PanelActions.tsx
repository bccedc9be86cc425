import { useTranslation } from 'react-i18next';
import { Button } from '../../../components/ui/Button.tsx';
import { BoardFault } from './BoardFault.tsx';
import { useBoardTools } from './board-context.tsx';

interface Props {
  readonly label: string;
  readonly onBack: () => void;
}

/** The foot of a form in a run's panel: why it failed, back, and the one thing it does. */
export function PanelActions({ label, onBack }: Props) {
  const { t } = useTranslation('board');
  const { busy, fault } = useBoardTools();
  return (
    <>
      <BoardFault fault={fault} />
      <div className="button-row justify-end">
        <Button onClick={onBack}>{t('back')}</Button>
        <Button kind="primary" type="submit" busy={busy} busyLabel={t('saving')}>
          {label}
        </Button>
      </div>
    </>
  );
}
