import { describe, expect, it } from 'vitest';
import { resultsOf, trialOf } from '../../../../tests/builders/verdict-cases.ts';
import { bestBet } from './best-bet.ts';
import { lookAtSettings } from './look-at-settings.ts';

describe('lookAtSettings', () => {
  const trial = trialOf('strong');
  const results = resultsOf(trial);
  const look = lookAtSettings(trial.brief, results);

  it('says of the settings to try what the best bet says', () => {
    const bet = bestBet(trial.brief, results);
    expect(look(bet.coded)).toEqual({ refused: null, outlooks: [bet.main, ...bet.watched], isRough: false });
  });

  it('refuses what was never tried, and names the setting', () => {
    expect(look([0, 1.2, 0, 1])).toEqual({ refused: 'outside', place: 1 });
  });

  it('refuses what is forbidden', () => {
    const brief = { ...trial.brief, forbidden: [{ A: 1, B: 1 } as const] };
    expect(lookAtSettings(brief, results)([1, 1, -1, -1])).toEqual({ refused: 'forbidden' });
  });

  it('refuses what failed', () => {
    const failed = trialOf('failedCorner');
    expect(lookAtSettings(failed.brief, resultsOf(failed))([1, 1, -1])).toEqual({ refused: 'failed' });
  });
});
