import { render, screen, within } from '@testing-library/react';
import { userEvent } from '@testing-library/user-event';
import { describe, expect, it, vi } from 'vitest';
import { ActionMenu } from './ActionMenu.tsx';
import { Disclosure } from './Disclosure.tsx';
import { Loading } from './Loading.tsx';
import { QuestionFrame } from './QuestionFrame.tsx';
import { Slider } from './Slider.tsx';

function renderMenu() {
  const skip = vi.fn();
  const repeat = vi.fn();
  const actions = [
    { key: 'skip', label: 'Skip run 4', onPick: skip },
    { key: 'repeat', label: 'Make run 4 again', onPick: repeat },
  ];
  render(
    <>
      <ActionMenu label="More" actions={actions} />
      <button type="button">elsewhere</button>
    </>,
  );
  const menu = screen.getByRole('group');
  return { menu, skip, repeat, open: () => userEvent.click(screen.getByText('More')) };
}

describe('ActionMenu', () => {
  it('does what is picked, once, and closes', async () => {
    const { menu, skip, repeat, open } = renderMenu();
    await open();
    expect(menu).toHaveAttribute('open');
    await userEvent.click(screen.getByRole('button', { name: 'Skip run 4' }));
    expect(skip).toHaveBeenCalledTimes(1);
    expect(repeat).not.toHaveBeenCalled();
    expect(menu).not.toHaveAttribute('open');
  });

  it('closes on Escape and keeps the focus at its name', async () => {
    const { menu, open } = renderMenu();
    await open();
    screen.getByRole('button', { name: 'Make run 4 again' }).focus();
    await userEvent.keyboard('{Escape}');
    expect(menu).not.toHaveAttribute('open');
    expect(screen.getByText('More').closest('summary')).toHaveFocus();
  });

  it('closes when the focus goes elsewhere', async () => {
    const { menu, open } = renderMenu();
    await open();
    await userEvent.click(screen.getByRole('button', { name: 'elsewhere' }));
    expect(menu).not.toHaveAttribute('open');
  });
});

describe('Disclosure', () => {
  it('starts closed unless told otherwise', () => {
    const { container } = render(<Disclosure summary="More">Any step</Disclosure>);
    expect(container.querySelector('details')).not.toHaveAttribute('open');
    const opened = render(
      <Disclosure summary="Why" startsOpen>
        Because
      </Disclosure>,
    );
    expect(opened.container.querySelector('details')).toHaveAttribute('open');
  });
});

describe('Slider', () => {
  it('says its value in words', () => {
    render(
      <Slider id="hours" label="Hours you can spare" min={1} max={9} defaultValue={4} valueWords="4 hours" />,
    );
    const slider = screen.getByRole('slider', { name: 'Hours you can spare' });
    expect(slider).toHaveAttribute('aria-valuetext', '4 hours');
    expect(screen.getByRole('status')).toHaveTextContent('4 hours');
  });
});

describe('Loading', () => {
  it('says what is being fetched and holds the room for it', () => {
    const { container } = render(<Loading label="Getting the runs" lines={4} />);
    expect(screen.getByRole('status')).toHaveTextContent('Getting the runs');
    expect(container.querySelector('svg[width="100%"]')).toHaveAttribute('height', '96');
  });
});

describe('QuestionFrame', () => {
  it('stands beside what is known so far, and under its one line on a phone', () => {
    render(
      <QuestionFrame side={<p>Would spot 4 N.</p>} sideLabel="So far" sideLine="11 runs">
        <h1>What can you change?</h1>
      </QuestionFrame>,
    );
    const aside = screen.getByRole('complementary', { name: 'So far' });
    expect(within(aside).getByText('Would spot 4 N.')).toBeVisible();
    expect(screen.getByText('11 runs').closest('summary')).toBeInTheDocument();
    expect(screen.getByRole('heading', { name: 'What can you change?' })).toBeVisible();
  });
});
