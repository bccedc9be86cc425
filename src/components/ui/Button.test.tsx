import { render, screen } from '@testing-library/react';
import { userEvent } from '@testing-library/user-event';
import { describe, expect, it, vi } from 'vitest';
import { Button } from './Button.tsx';
import { ButtonLink } from './ButtonLink.tsx';

function renderInForm(button: React.ReactNode) {
  const send = vi.fn((event: { preventDefault(): void }) => event.preventDefault());
  render(<form onSubmit={send}>{button}</form>);
  return send;
}

describe('Button', () => {
  it('is pressed by mouse, Enter and Space', async () => {
    const press = vi.fn();
    render(<Button onClick={press}>Next</Button>);
    await userEvent.click(screen.getByRole('button', { name: 'Next' }));
    await userEvent.keyboard('{Enter} ');
    expect(press).toHaveBeenCalledTimes(3);
  });

  it('sends a form only when it says so', async () => {
    const send = renderInForm(
      <>
        <Button>More</Button>
        <Button type="submit">Save</Button>
      </>,
    );
    await userEvent.click(screen.getByRole('button', { name: 'More' }));
    expect(send).not.toHaveBeenCalled();
    await userEvent.click(screen.getByRole('button', { name: 'Save' }));
    expect(send).toHaveBeenCalledTimes(1);
  });

  it('says what it does while busy, keeps the focus and takes no second press', async () => {
    const press = vi.fn();
    const button = (busy: boolean) => (
      <form onSubmit={press}>
        <Button type="submit" busy={busy} busyLabel="Saving" onClick={press}>
          Save
        </Button>
      </form>
    );
    const { rerender } = render(button(false));
    screen.getByRole('button', { name: 'Save' }).focus();
    rerender(button(true));
    const working = screen.getByRole('button', { name: 'Saving' });
    expect(working).toHaveFocus();
    expect(working).toHaveAttribute('aria-busy', 'true');
    await userEvent.keyboard('{Enter}');
    await userEvent.click(working);
    expect(press).not.toHaveBeenCalled();
  });

  it('cannot be pressed when disabled', async () => {
    const press = vi.fn();
    render(
      <Button disabled onClick={press}>
        Next
      </Button>,
    );
    await userEvent.click(screen.getByRole('button', { name: 'Next' }));
    expect(press).not.toHaveBeenCalled();
  });
});

describe('ButtonLink', () => {
  it('is a link, its icons say nothing', () => {
    render(
      <ButtonLink href="/print" icon="print" iconEnd="chevron-right">
        Print
      </ButtonLink>,
    );
    const link = screen.getByRole('link', { name: 'Print' });
    expect(link).toHaveAttribute('href', '/print');
    for (const icon of link.querySelectorAll('svg')) expect(icon).toHaveAttribute('aria-hidden', 'true');
  });
});
