import { act, render, screen } from '@testing-library/react';
import { userEvent } from '@testing-library/user-event';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { Button } from './Button.tsx';
import { Callout, type CalloutTone } from './Callout.tsx';
import { Toast, ToastList } from './Toast.tsx';
import { useToasts } from './use-toasts.ts';

describe('Callout', () => {
  it('is plain words on a page that was loaded with it', () => {
    render(<Callout tone="caution">Go wider if it is safe.</Callout>);
    expect(screen.queryByRole('alert')).toBeNull();
    expect(screen.queryByRole('status')).toBeNull();
    expect(screen.getByText('Go wider if it is safe.')).toBeVisible();
  });

  it.each([
    ['polite', 'status'],
    ['assertive', 'alert'],
  ] as const)('that appears %s is a %s', (live, role) => {
    render(
      <Callout tone="stop" title="Stopped at 10:20." live={live} actions={<Button>Call Minh</Button>}>
        Ana got the text.
      </Callout>,
    );
    expect(screen.getByRole(role)).toHaveTextContent('Stopped at 10:20.Ana got the text.Call Minh');
  });

  it('draws another icon for each tone, so that the meaning is not in the color alone', () => {
    const tones: CalloutTone[] = ['info', 'caution', 'stop', 'good'];
    const drawings = tones.map((tone) => {
      const { container } = render(<Callout tone={tone}>Words</Callout>);
      return container.querySelector('svg path')?.getAttribute('d');
    });
    expect(new Set(drawings).size).toBe(tones.length);
  });
});

function Toaster() {
  const { toasts, show, close } = useToasts();
  return (
    <>
      <button type="button" onClick={() => show('good', 'Run 4 saved')}>
        save
      </button>
      <button type="button" onClick={() => show('caution', 'No answer yet')}>
        warn
      </button>
      <ToastList label="News">
        {toasts.map((toast) => (
          <Toast key={toast.id} tone={toast.tone} closeLabel="Close" onClose={() => close(toast.id)}>
            {toast.words}
          </Toast>
        ))}
      </ToastList>
    </>
  );
}

describe('toasts', () => {
  beforeEach(() => {
    vi.useFakeTimers({ shouldAdvanceTime: true });
  });
  afterEach(() => {
    vi.useRealTimers();
  });

  it('are read out without breaking in; good news leaves by itself, a caution stays until it is closed', async () => {
    render(<Toaster />);
    expect(screen.getByRole('list', { name: 'News' })).toHaveAttribute('aria-live', 'polite');
    await userEvent.click(screen.getByRole('button', { name: 'save' }));
    await userEvent.click(screen.getByRole('button', { name: 'warn' }));
    expect(screen.getAllByRole('listitem')).toHaveLength(2);
    act(() => vi.advanceTimersByTime(8000));
    expect(screen.getAllByRole('listitem').map((item) => item.textContent)).toEqual(['No answer yetClose']);
    await userEvent.click(screen.getByRole('button', { name: 'Close' }));
    expect(screen.queryAllByRole('listitem')).toEqual([]);
  });
});
