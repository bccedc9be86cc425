import { render, screen } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { type Hazard, HazardSign } from './HazardSign.tsx';
import { Icon } from './Icon.tsx';
import { type IconName, iconShapes } from './icon-shapes.ts';
import { SettingMark, type SettingMarkKind } from './SettingMark.tsx';

const filledRects = (container: HTMLElement) => [...container.querySelectorAll('rect[fill="currentColor"]')];

describe('level mark', () => {
  it.each([
    ['low', 0],
    ['middle', 6],
    ['high', 12],
  ] as const)('at %s is filled %d px high', (mark, height) => {
    const { container } = render(<SettingMark mark={mark} />);
    expect(filledRects(container).map((rect) => Number(rect.getAttribute('height')))).toEqual(
      height ? [height] : [],
    );
  });

  it('fills the box that is chosen', () => {
    const left = (mark: SettingMarkKind) =>
      filledRects(render(<SettingMark mark={mark} />).container).map((rect) =>
        Number(rect.getAttribute('x')),
      );
    const [first = Number.NaN, ...others] = left('first');
    const [second = Number.NaN] = left('second');
    expect(others).toEqual([]);
    expect(second).toBeGreaterThan(first);
  });

  it('is silent beside its word and speaks where it stands alone', () => {
    const { container } = render(<SettingMark mark="high" />);
    expect(container).toHaveTextContent('');
    render(<SettingMark mark="high" label="high" size={36} />);
    expect(screen.getByText('high')).toBeInTheDocument();
  });
});

describe('drawings', () => {
  it.each(Object.keys(iconShapes) as IconName[])('icon %s stays on its grid', (name) => {
    const { container } = render(<Icon name={name} />);
    expect(container.querySelector('svg')).toHaveAttribute('aria-hidden', 'true');
    expect(iconShapes[name]).toMatch(/^[Mm][-\d. MmLlHhVvCcSsAaZz]+$/);
  });

  it('show another picture for each hazard', () => {
    const hazards: Hazard[] = [
      'hot',
      'pressure',
      'moving',
      'chemicals',
      'electricity',
      'dust',
      'lifting',
      'noise',
      'other',
    ];
    const pictures = hazards.map((hazard) =>
      render(<HazardSign hazard={hazard} />)
        .container.querySelectorAll('path')[1]
        ?.getAttribute('d'),
    );
    expect(new Set(pictures).size).toBe(hazards.length);
  });
});
