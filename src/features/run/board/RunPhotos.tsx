import { useState } from 'react';
import { useTranslation } from 'react-i18next';
import { Button } from '../../../components/ui/Button.tsx';
import { ConfirmDialog } from '../../../components/ui/ConfirmDialog.tsx';
import { removePhotoCall } from '../board.queries.ts';
import type { BoardRun } from '../board.schema.ts';
import { useBoardTools } from './board-context.tsx';

/** The pictures of a run, small; each opens in full, and whoever runs the trial may take it away. */
export function RunPhotos({ run }: { readonly run: BoardRun }) {
  const { t } = useTranslation('board');
  const { board, formats, refreshBoard, say } = useBoardTools();
  const [leaving, setLeaving] = useState<string | null>(null);
  if (run.photos.length === 0) return null;

  async function remove(): Promise<void> {
    if (leaving === null) return;
    await removePhotoCall(leaving);
    setLeaving(null);
    await refreshBoard();
    say('good', t('photoGone'));
  }
  return (
    <section className="grid gap-2">
      <h3>{t('photos')}</h3>
      <ul className="board-photos">
        {run.photos.map(({ id, width, height, by, at }) => (
          <li key={id}>
            <a href={`/api/photos/${id}`} target="_blank" rel="noopener">
              <img
                src={`/api/photos/${id}`}
                width={width}
                height={height}
                loading="lazy"
                alt={t('photo', { run: run.number, name: by, time: formats.dateTime(at) })}
              />
            </a>
            {board.mayRun && <Button onClick={() => setLeaving(id)}>{t('photoRemove')}</Button>}
          </li>
        ))}
      </ul>
      <ConfirmDialog
        open={leaving !== null}
        title={t('photoAsk')}
        confirmLabel={t('photoRemove')}
        cancelLabel={t('back')}
        closeLabel={t('close')}
        onConfirm={remove}
        onCancel={() => setLeaving(null)}
      />
    </section>
  );
}
