import { render, screen, within } from '@testing-library/react';
import { userEvent } from '@testing-library/user-event';
import { describe, expect, it, vi } from 'vitest';
import { Button } from './Button.tsx';
import { iconShapes } from './icon-shapes.ts';
import { JobTag, type TagSetting } from './JobTag.tsx';
import { SmallTag } from './SmallTag.tsx';
import { tagStateIcons } from './tag-state.ts';

const settings: readonly TagSetting[] = [
  { name: 'JAW TEMP', value: '160', unit: '°C', mark: 'high' },
  { name: 'DWELL', value: '0.9', mark: 'middle' },
  { name: 'FILM', value: 'B', mark: 'second' },
  { name: 'PRESS', value: '3.0', mark: 'low' },
  { name: 'FEED', value: '12' },
  { name: 'COOLING', value: 'on', mark: 'first' },
  { name: 'SPEED', value: '60', mark: 'low' },
];

const tag = { number: '4', name: 'Run 4', state: 'making', stateWord: 'making' } as const;

describe('JobTag', () => {
  it('is named by its run, with the state in words and every setting with its value', () => {
    render(<JobTag {...tag} settings={settings.slice(0, 4)} foot="Ana, since 10:02" current />);
    const article = screen.getByRole('article', { name: 'Run 4' });
    expect(within(article).getByRole('heading', { level: 3, name: 'Run 4' })).toBeVisible();
    expect(article).toHaveTextContent('making');
    expect(article).toHaveTextContent('Ana, since 10:02');
    expect(
      within(article)
        .getAllByRole('term')
        .map((term) => term.textContent),
    ).toEqual(['JAW TEMP', 'DWELL', 'FILM', 'PRESS']);
    expect(
      within(article)
        .getAllByRole('definition')
        .map((value) => value.textContent),
    ).toEqual(['160 °C', '0.9', 'B', '3.0']);
  });

  it('shows five settings and says how many more there are', () => {
    render(<JobTag {...tag} settings={settings} moreLabel="and 2 more" />);
    expect(screen.getAllByRole('term')).toHaveLength(5);
    expect(screen.getByText('and 2 more')).toBeVisible();
  });

  it('says nothing about more where there is none', () => {
    render(<JobTag {...tag} settings={settings.slice(0, 5)} moreLabel="and 2 more" />);
    expect(screen.queryByText('and 2 more')).toBeNull();
  });

  it('opens by keyboard, as a link or as a button, beside its own actions', async () => {
    const open = vi.fn();
    const handOver = vi.fn();
    render(
      <>
        <JobTag
          {...tag}
          settings={settings}
          onOpen={open}
          actions={<Button onClick={handOver}>Hand over</Button>}
        />
        <JobTag {...tag} name="Run 5" settings={settings} href="/runs/5" />
      </>,
    );
    await userEvent.tab();
    expect(screen.getByRole('button', { name: 'Run 4' })).toHaveFocus();
    await userEvent.keyboard('{Enter}');
    expect(open).toHaveBeenCalledTimes(1);
    await userEvent.click(screen.getByRole('button', { name: 'Hand over' }));
    expect(handOver).toHaveBeenCalledTimes(1);
    expect(open).toHaveBeenCalledTimes(1);
    expect(screen.getByRole('link', { name: 'Run 5' })).toHaveAttribute('href', '/runs/5');
  });

  it('is only to be read where it opens nothing', () => {
    render(<JobTag {...tag} settings={settings} printNote="Job tag. Not a lockout tag." />);
    expect(screen.queryByRole('button')).toBeNull();
    expect(screen.queryByRole('link')).toBeNull();
    expect(screen.getByText('Job tag. Not a lockout tag.')).toBeInTheDocument();
  });
});

describe('tag states', () => {
  it('have a drawing each, and no two the same', () => {
    const drawings = Object.values(tagStateIcons).map((icon) => iconShapes[icon]);
    expect(new Set(drawings).size).toBe(10);
  });
});

describe('SmallTag', () => {
  it('is one picture with a name', () => {
    render(
      <SmallTag number="2" name="Run 2: Jaw temp high" settings={[{ name: 'Jaw temp', mark: 'high' }]} />,
    );
    expect(screen.getByRole('img', { name: 'Run 2: Jaw temp high' })).toBeVisible();
  });
});
