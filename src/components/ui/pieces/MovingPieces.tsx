import { useState } from 'react';
import { ActionMenu } from '../ActionMenu.tsx';
import { Button } from '../Button.tsx';
import { ConfirmDialog } from '../ConfirmDialog.tsx';
import { Dialog } from '../Dialog.tsx';
import { Select } from '../Select.tsx';
import { Toast, ToastList } from '../Toast.tsx';
import { useToasts } from '../use-toasts.ts';
import { words } from './sample-words.ts';

/** What moves only in an island, on the page for developers. */
export function MovingPieces() {
  const [shown, setShown] = useState<'none' | 'dialog' | 'confirm'>('none');
  const { toasts, show, close } = useToasts();
  const closeDialog = () => setShown('none');

  return (
    <>
      <div className="button-row">
        <Button onClick={() => setShown('dialog')}>{words.openDialog}</Button>
        <Button onClick={() => setShown('confirm')}>{words.openConfirm}</Button>
        <Button onClick={() => show('good', words.savedToast)}>{words.toastGood}</Button>
        <Button onClick={() => show('caution', words.lateToast)}>{words.toastCaution}</Button>
        <ActionMenu
          label={words.more}
          actions={[
            { key: 'skip', label: words.skipRun, icon: 'skip', onPick: () => show('info', words.skipRun) },
            {
              key: 'repeat',
              label: words.repeatRun,
              icon: 'repeat',
              onPick: () => show('info', words.repeatRun),
            },
          ]}
        />
      </div>
      <Dialog
        open={shown === 'dialog'}
        onClose={closeDialog}
        title={words.dialogTitle}
        closeLabel={words.close}
        actions={
          <>
            <Button onClick={closeDialog}>{words.back}</Button>
            <Button kind="primary" onClick={closeDialog}>
              {words.handOver}
            </Button>
          </>
        }
      >
        <p className="mb-4">{words.dialogWords}</p>
        <Select id="hand-over-to" label={words.to} options={words.callers} data-first-focus />
      </Dialog>
      <ConfirmDialog
        open={shown === 'confirm'}
        title={words.confirmTitle}
        confirmLabel={words.confirm}
        busyLabel={words.ending}
        cancelLabel={words.keep}
        closeLabel={words.close}
        kind="stop"
        onConfirm={closeDialog}
        onCancel={closeDialog}
      >
        {words.confirmWords}
      </ConfirmDialog>
      <ToastList label={words.toasts}>
        {toasts.map((toast) => (
          <Toast key={toast.id} tone={toast.tone} closeLabel={words.close} onClose={() => close(toast.id)}>
            {toast.words}
          </Toast>
        ))}
      </ToastList>
    </>
  );
}
