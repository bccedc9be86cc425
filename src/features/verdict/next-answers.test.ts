import { describe, expect, it } from 'vitest';
import { type CaseName, verdictCase } from '../../../tests/builders/verdict-cases.ts';
import type { Answers, SettingAnswer } from '../trial/answers.schema.ts';
import { followReasonsOf } from './follow-reason.ts';
import { type FollowedTrial, nextAnswers } from './next-answers.ts';

/** A case as if its settings had been typed in the wizard. */
function followed(name: CaseName, adopted = false): FollowedTrial {
  const { brief, bet, verdict, runs } = verdictCase(name);
  const settingIds = brief.factors.map((_, place) => `s${place}`);
  const settings = brief.factors.map((factor, place): SettingAnswer => {
    const manners = { id: `s${place}`, name: factor.name };
    if (factor.kind === 'choice')
      return { kind: 'choice', ...manners, low: factor.low, high: factor.high, usual: factor.usual };
    const { low, high, usual, unit } = factor;
    return { kind: 'number', ...manners, unit, low: `${low}`, high: `${high}`, usual: `${usual}` };
  });
  const answers: Answers = {
    job: { title: 'Line 3 seals', machine: 'Line 3' },
    settings: { settings },
    usual: { usual: '35 N', lowest: '33', highest: '37,5' },
    neverRun: {
      mixes: [
        {
          id: 'hot and long',
          parts: [
            { setting: 's0', end: 'high' },
            { setting: 's1', end: 'high' },
          ],
        },
      ],
    },
    spare: { runs: '8' },
    ready: { ticked: ['guardsOn'] },
    pace: { startDate: '2026-03-12', next: 'made' },
  };
  return { answers, brief, settingIds, bet, verdict, runs: runs.length, adopted };
}

const rangesOf = ({ settings }: Answers) =>
  (settings?.settings ?? []).map(({ low, high, usual }) => [low, usual, high].join(' '));

describe('the answers of the next trial', () => {
  it('move the ranges the good way and keep today’s settings inside them', () => {
    const trial = followed('strong');
    expect(followReasonsOf(verdictCase('strong'))).toEqual(['move-window']);
    expect(rangesOf(nextAnswers(trial, 'move-window'))).toEqual([
      '145 150 165',
      '0.8 0.8 1.05',
      '3 3 4',
      'Supplier A low Supplier B',
    ]);
  });

  it('take the new settings as usual where they are in use, with the day’s range moved along', () => {
    const next = nextAnswers(followed('strong', true), 'move-window');
    expect(rangesOf(next).slice(0, 2)).toEqual(['145 160 165', '0.85 1 1.05']);
    expect(Number(next.usual?.usual)).toBeCloseTo(41, 0);
    expect(Number(next.usual?.highest)).toBeGreaterThan(43);
  });

  it('stay away from what failed', () => {
    expect(rangesOf(nextAnswers(followed('failedCorner'), 'narrow-range')).slice(0, 2)).toEqual([
      '140 150 150',
      '0.8 0.8 0.9',
    ]);
  });

  it('close in on the best spot of a curve without losing today’s setting', () => {
    expect(rangesOf(nextAnswers(followed('curved'), 'follow-the-curve'))).toEqual(['140 140 155']);
  });

  it('have room for the runs that it takes to be surer', () => {
    const next = nextAnswers(followed('tied'), 'repeat-for-certainty');
    expect(Number(next.spare?.runs)).toBeGreaterThan(8);
    expect(Number(next.spare?.runs)).toBeLessThanOrEqual(64);
  });

  it('carry what was typed, but nothing that was ticked for another day', () => {
    const next = nextAnswers(followed('strong'), 'move-window');
    expect(next.job).toEqual({ title: 'Line 3 seals 2', machine: 'Line 3' });
    expect(next.neverRun?.mixes).toHaveLength(1);
    expect(next.ready).toBeUndefined();
    expect(next.pace).toEqual({ next: 'made' });
    expect(next.usual?.usual).toBe('35 N');
  });
});
