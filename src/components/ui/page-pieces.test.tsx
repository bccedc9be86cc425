import { render, screen, within } from '@testing-library/react';
import { userEvent } from '@testing-library/user-event';
import { describe, expect, it } from 'vitest';
import { ActionBar } from './ActionBar.tsx';
import { Button } from './Button.tsx';
import { EmptyState } from './EmptyState.tsx';
import { PageHead } from './PageHead.tsx';
import { Pager } from './Pager.tsx';
import { SectionTabs } from './SectionTabs.tsx';
import { SettingsCard } from './SettingsCard.tsx';
import { type Step, Stepper } from './Stepper.tsx';

const steps: Step[] = [
  { key: 'problem', number: '1', label: 'Problem', state: 'done', stateWord: 'done', href: '/1' },
  { key: 'today', number: '2', label: 'Today', state: 'gap', stateWord: 'answers missing', href: '/2' },
  { key: 'settings', number: '3', label: 'Settings', state: 'current', href: '/3' },
  { key: 'safety', number: '4', label: 'Safety', state: 'open' },
];

describe('Stepper', () => {
  it('says number, word and state of each step, and which is the current one', () => {
    render(<Stepper label="Questions" steps={steps} />);
    const nav = screen.getByRole('navigation', { name: 'Questions' });
    expect(within(nav).getByRole('link', { name: '1 Problem done' })).toHaveAttribute('href', '/1');
    expect(within(nav).getByRole('link', { name: '2 Today answers missing' })).toHaveAttribute('href', '/2');
    expect(screen.getByRole('link', { current: 'step' })).toHaveAccessibleName('3 Settings');
  });

  it('does not lead to a step that was never seen', () => {
    render(<Stepper label="Questions" steps={steps} />);
    expect(screen.queryByRole('link', { name: /Safety/ })).toBeNull();
    expect(screen.getByText('Safety')).toBeVisible();
  });
});

describe('PageHead', () => {
  it('is the heading with its way back and its actions', async () => {
    render(
      <PageHead
        title="People"
        note="Who takes part."
        back={{ href: '/', label: 'Back' }}
        actions={<Button>Invite</Button>}
      />,
    );
    expect(screen.getByRole('heading', { level: 1, name: 'People' })).toBeVisible();
    await userEvent.tab();
    expect(screen.getByRole('link', { name: 'Back' })).toHaveFocus();
    await userEvent.tab();
    expect(screen.getByRole('button', { name: 'Invite' })).toHaveFocus();
  });
});

describe('EmptyState', () => {
  it('says what to do first', () => {
    render(
      <EmptyState title="No trials yet" actions={<Button kind="primary">New trial</Button>}>
        Start with what is wrong.
      </EmptyState>,
    );
    expect(screen.getByRole('heading', { name: 'No trials yet' })).toBeVisible();
    expect(screen.getByText('Start with what is wrong.')).toBeVisible();
    expect(screen.getByRole('button', { name: 'New trial' })).toBeVisible();
  });
});

describe('Pager', () => {
  it('has no button where the list ends', () => {
    render(<Pager label="Pages" status="1 to 20 of 63" next={{ href: '?after=20', label: 'Later' }} />);
    const pager = screen.getByRole('navigation', { name: 'Pages' });
    expect(
      within(pager)
        .getAllByRole('link')
        .map((link) => link.textContent),
    ).toEqual(['Later']);
    expect(screen.getByRole('link', { name: 'Later' })).toHaveAttribute('rel', 'next');
  });
});

describe('SectionTabs', () => {
  it('marks the page one is on', () => {
    const tabs = [
      { href: '/board', label: 'Board', current: true },
      { href: '/verdict', label: 'Verdict' },
    ];
    render(<SectionTabs label="This trial" tabs={tabs} />);
    expect(screen.getByRole('link', { current: 'page' })).toHaveAccessibleName('Board');
  });
});

describe('ActionBar', () => {
  it('leads back before it leads on', () => {
    render(
      <ActionBar secondary={<Button>Back</Button>}>
        <Button kind="primary">Next</Button>
      </ActionBar>,
    );
    expect(screen.getAllByRole('button').map((button) => button.textContent)).toEqual(['Back', 'Next']);
  });
});

describe('SettingsCard', () => {
  it('holds the settings, the way back and whom to call', () => {
    render(
      <SettingsCard
        title="Line 3"
        settings={[{ name: 'JAW TEMP', value: '158', unit: '°C' }]}
        parts={[{ title: 'Whom to call', words: 'Dana, ext 12' }]}
        foot="Guards stay on."
      />,
    );
    expect(screen.getByRole('definition')).toHaveTextContent('158 °C');
    expect(screen.getByRole('heading', { name: 'Whom to call' })).toBeVisible();
    expect(screen.getByText('Guards stay on.')).toBeVisible();
  });
});
