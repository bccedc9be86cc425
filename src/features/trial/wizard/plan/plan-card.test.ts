import { describe, expect, it } from 'vitest';
import { finishedAnswers } from '../../../../../tests/builders/answers.ts';
import { type Proposal, proposePlans } from '../../../../lib/doe/index.ts';
import { toBrief } from '../../to-brief.ts';
import { splitFacts, tiedSettings, timesInTen, titleOf } from './plan-card.ts';

function proposals(): Proposal[] {
  const read = toBrief(finishedAnswers({ neverRun: { mixes: [] }, spare: {} }));
  if ('problems' in read) throw new RangeError('finishedAnswers are not finished');
  return proposePlans(read.brief);
}

describe('the card of a plan', () => {
  const [recommended, ...others] = proposals();
  if (!recommended) throw new RangeError('no plan');

  it('is headed by what sets it apart from the one we would take', () => {
    expect(titleOf(recommended, recommended)).toBe('recommended');
    for (const other of others) {
      const title = titleOf(other, recommended);
      if (title === 'quicker') expect(other.runs).toBeLessThan(recommended.runs);
      if (title === 'middle') expect([other.centerPoints > 0, recommended.centerPoints]).toEqual([true, 0]);
    }
    const bare = { ...recommended, recommended: false, reasons: [] };
    expect(titleOf({ ...bare, centerPoints: 3 }, { ...bare, centerPoints: 0 })).toBe('middle');
    expect(titleOf({ ...bare, centerPoints: 3 }, { ...bare, centerPoints: 3 })).toBe('other');
  });

  it('keeps what must be known in view, and says nothing twice or never', () => {
    for (const proposal of [recommended, ...others]) {
      const { shown, folded } = splitFacts(proposal);
      expect(shown.filter((fact) => folded.includes(fact))).toEqual([]);
      const ways = ['main-effects-apart', 'pairs-apart'];
      const isApart = proposal.reasons.some(({ kind }) => ways.includes(kind));
      expect(tiedSettings(proposal).length > 0).toBe(!isApart);
    }
  });

  it('promises a find neither always nor with more than a figure', () => {
    expect(timesInTen({ ...recommended, powerAtWorthHaving: 0.999 })).toBe(9);
    expect(timesInTen({ ...recommended, powerAtWorthHaving: 0.02 })).toBe(0);
    expect(timesInTen({ ...recommended, powerAtWorthHaving: null })).toBeNull();
  });
});
