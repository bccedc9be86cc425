import { render, screen } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { EffectList } from './EffectList.tsx';
import { EffectTrack, findEffectDomain } from './EffectTrack.tsx';
import { effects } from './pieces/sample-figures.ts';
import { SettingTrack } from './SettingTrack.tsx';

const low = { value: 140, label: '140' };
const high = { value: 160, label: '160' };

function percent(element: Element | null | undefined, attribute: string): number {
  return Number.parseFloat(element?.getAttribute(attribute) ?? 'NaN');
}

describe('SettingTrack', () => {
  it('is one picture that says the whole track', () => {
    render(<SettingTrack low={low} high={high} label="Jaw temp: low 140, high 160" />);
    expect(screen.getByRole('img', { name: 'Jaw temp: low 140, high 160' })).toBeVisible();
  });

  it('draws an unknown limit dashed and a known one with an end', () => {
    const { container } = render(
      <SettingTrack low={low} high={high} min={{ value: 120, label: '120' }} label="Jaw temp" />,
    );
    const dashes = [...container.querySelectorAll('.track-line')].map((line) =>
      line.getAttribute('stroke-dasharray'),
    );
    expect(dashes).toEqual([null, '5 5']);
    expect(container.querySelectorAll('.track-end')).toHaveLength(1);
    expect(screen.getByText('120')).toBeInTheDocument();
  });

  it('hangs the window between low and high, the pin at today and the flag at the value to try', () => {
    const { container } = render(
      <SettingTrack
        low={low}
        high={high}
        now={{ value: 150, label: 'now 150' }}
        next={{ value: 160, label: '160' }}
        label="Jaw temp"
      />,
    );
    const frame = container.querySelector('.track-window');
    const anchorOf = (selector: string) => container.querySelector(selector)?.closest('.track-anchor');
    const start = percent(frame, 'x');
    const width = percent(frame, 'width');
    expect(percent(anchorOf('.track-pin'), 'x')).toBeCloseTo(start + width / 2, 1);
    expect(percent(anchorOf('.track-flag'), 'x')).toBeCloseTo(start + width, 1);
  });

  it('says a limit once where today is at it', () => {
    render(
      <SettingTrack
        low={low}
        high={high}
        now={{ value: 160, label: 'now 160' }}
        max={{ value: 160, label: 'most 160' }}
        label="Jaw temp"
      />,
    );
    expect(screen.getByText('now 160')).toBeInTheDocument();
    expect(screen.queryByText('most 160')).toBeNull();
  });

  it.each([
    [141, 1],
    [199, -1],
  ])('flies the flag at %d toward the middle', (value, side) => {
    const { container } = render(
      <SettingTrack
        low={low}
        high={high}
        next={{ value, label: String(value) }}
        min={{ value: 120, label: '120' }}
        max={{ value: 200, label: '200' }}
        label="Jaw temp"
      />,
    );
    expect(Math.sign(percent(container.querySelector('.track-flag-words'), 'x'))).toBe(side);
  });
});

describe('findEffectDomain', () => {
  it('holds every end and the band, with zero in the middle', () => {
    expect(findEffectDomain([{ change: 1, from: -7, to: 4 }], 3)).toEqual({ from: -7, to: 7 });
    expect(findEffectDomain([{ change: 1, from: 0, to: 2 }], 3)).toEqual({ from: -3, to: 3 });
  });

  it('does not follow an interval without an end, and is never empty', () => {
    expect(findEffectDomain([{ change: 1, from: Number.NEGATIVE_INFINITY, to: 2 }], 0)).toEqual({
      from: -2,
      to: 2,
    });
    expect(findEffectDomain([], 0)).toEqual({ from: -1, to: 1 });
  });
});

describe('EffectTrack', () => {
  const domain = { from: -8, to: 8 };

  it('puts better right of zero and worse left of it', () => {
    const better = render(<EffectTrack change={6} from={4} to={8} worthHaving={3} domain={domain} />);
    expect(percent(better.container.querySelector('.effect-bar'), 'x')).toBe(50);
    const worse = render(<EffectTrack change={-2} from={-4} to={0} worthHaving={3} domain={domain} />);
    expect(percent(worse.container.querySelector('.effect-bar'), 'x')).toBeLessThan(50);
  });

  it('lets an endless interval run off the track without a cap', () => {
    const { container } = render(
      <EffectTrack change={1} from={Number.NEGATIVE_INFINITY} to={3} worthHaving={3} domain={domain} />,
    );
    const [line, ...caps] = container.querySelectorAll('.effect-interval');
    expect(percent(line, 'x1')).toBe(0);
    expect(caps).toHaveLength(1);
  });
});

describe('EffectList', () => {
  it('says each change, its interval and the call in words', () => {
    render(
      <EffectList
        rows={effects.slice(0, 1)}
        worthHaving={3}
        worseLabel="worse"
        betterLabel="better, N"
        bandLabel="not worth having"
      />,
    );
    expect(screen.getByRole('listitem')).toHaveTextContent(
      'Jaw temp 140 to 1606 N stronger, 4 to 8Matters. Clear.',
    );
  });
});
