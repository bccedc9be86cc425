import { render, screen } from '@testing-library/react';
import { userEvent } from '@testing-library/user-event';
import { useState } from 'react';
import { describe, expect, it, vi } from 'vitest';
import { ConfirmDialog } from './ConfirmDialog.tsx';
import { Dialog } from './Dialog.tsx';

function Opener({ onConfirm = () => {} }: { onConfirm?: () => void }) {
  const [shown, setShown] = useState<'none' | 'dialog' | 'confirm'>('none');
  const close = () => setShown('none');
  return (
    <>
      <button type="button" onClick={() => setShown('dialog')}>
        hand over
      </button>
      <button type="button" onClick={() => setShown('confirm')}>
        end
      </button>
      <Dialog open={shown === 'dialog'} onClose={close} title="Hand over run 4" closeLabel="Close">
        <input aria-label="To" data-first-focus />
      </Dialog>
      <ConfirmDialog
        open={shown === 'confirm'}
        title="End with 4 of 11 runs?"
        confirmLabel="End it"
        cancelLabel="Keep it running"
        closeLabel="Close"
        kind="stop"
        onConfirm={() => {
          onConfirm();
          close();
        }}
        onCancel={close}
      >
        Four runs can tell very little.
      </ConfirmDialog>
    </>
  );
}

describe('Dialog', () => {
  it('opens as a modal with a name and puts the focus where it is asked to', async () => {
    const showModal = vi.spyOn(HTMLDialogElement.prototype, 'showModal');
    render(<Opener />);
    expect(screen.queryByRole('dialog')).toBeNull();
    await userEvent.click(screen.getByRole('button', { name: 'hand over' }));
    expect(screen.getByRole('dialog', { name: 'Hand over run 4' })).toHaveAttribute('open');
    expect(screen.getByRole('textbox', { name: 'To' })).toHaveFocus();
    expect(showModal).toHaveBeenCalledTimes(1);
  });

  it('closes by its button and by the cancel event that Escape raises', async () => {
    render(<Opener />);
    await userEvent.click(screen.getByRole('button', { name: 'hand over' }));
    await userEvent.click(screen.getByRole('button', { name: 'Close' }));
    expect(screen.queryByRole('dialog')).toBeNull();

    await userEvent.click(screen.getByRole('button', { name: 'hand over' }));
    const cancel = new Event('cancel', { cancelable: true });
    screen.getByRole('dialog').dispatchEvent(cancel);
    expect(cancel.defaultPrevented).toBe(true);
    await vi.waitFor(() => expect(screen.queryByRole('dialog')).toBeNull());
  });
});

describe('ConfirmDialog', () => {
  it('asks as an alert with the focus on the harmless answer', async () => {
    const confirm = vi.fn();
    render(<Opener onConfirm={confirm} />);
    await userEvent.click(screen.getByRole('button', { name: 'end' }));
    expect(screen.getByRole('alertdialog', { name: 'End with 4 of 11 runs?' })).toHaveTextContent(
      'very little',
    );
    expect(screen.getByRole('button', { name: 'Keep it running' })).toHaveFocus();
    await userEvent.keyboard('{Enter}');
    expect(confirm).not.toHaveBeenCalled();
    expect(screen.queryByRole('alertdialog')).toBeNull();
  });

  it('does it when told to', async () => {
    const confirm = vi.fn();
    render(<Opener onConfirm={confirm} />);
    await userEvent.click(screen.getByRole('button', { name: 'end' }));
    await userEvent.click(screen.getByRole('button', { name: 'End it' }));
    expect(confirm).toHaveBeenCalledTimes(1);
  });
});
