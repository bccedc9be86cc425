import { describe, expect, it } from 'vitest';
import { type CheckedText, judgeCheck } from './texts-check.ts';

const start = 1_000_000;
const second = 1_000;
const fresh: CheckedText = {
  state: 'waiting',
  createdAt: start,
  notBefore: start,
  sentAt: null,
  providerStatus: null,
  errorCode: null,
};
const sent: CheckedText = { ...fresh, state: 'sent', sentAt: start, providerStatus: 'sent' };
const delivered: CheckedText = { ...sent, state: 'delivered', providerStatus: 'delivered' };

function judge(
  text: CheckedText | null,
  after: number,
  answer: { after: number; late?: number } | null = null,
) {
  const at = start + (answer?.after ?? 0);
  const came = answer && { sentAt: at, receivedAt: at + (answer.late ?? 0) };
  const found = judgeCheck(text, came, start + after);
  return Object.values(found).map(({ state, why }) => (why ? `${state} ${why}` : state));
}

describe('the check of the texts (sent, delivered, answered, signature)', () => {
  it('waits before it has begun', () => {
    expect(judge(null, 0)).toEqual(['waiting', 'waiting', 'waiting', 'waiting proof']);
  });

  it('goes from step to step', () => {
    expect(judge(fresh, second)[0]).toBe('waiting');
    expect(judge(sent, second)).toEqual(['good', 'waiting', 'waiting', 'waiting proof']);
    expect(judge(delivered, second)).toEqual(['good', 'good', 'waiting answerNow', 'good']);
    expect(judge(delivered, second, { after: second })).toEqual(['good', 'good', 'good', 'good']);
  });

  it.each([
    ['texts wait for work hours', { ...fresh, notBefore: start + 999_999 }, second, 'waiting hours'],
    ['nothing goes out', fresh, 31 * second, 'bad worker'],
    [
      'the service refuses',
      { ...fresh, state: 'failed', errorCode: '21608' } as CheckedText,
      1,
      'bad refused',
    ],
  ])('says so when %s', (_, text, after, finding) => {
    expect(judge(text, after)[0]).toBe(finding);
  });

  it('says when the phone did not get it, which is a signed report too', () => {
    const lost: CheckedText = { ...sent, state: 'failed', providerStatus: 'undelivered', errorCode: '30003' };
    expect(judge(lost, second)).toEqual(['good', 'bad undelivered', 'waiting', 'good']);
  });

  it('says when no report comes back, and then doubts the signature too', () => {
    expect(judge(sent, 61 * second)).toEqual(['good', 'bad noReport', 'waiting', 'bad noReport']);
  });

  it('says when the answer does not come in', () => {
    expect(judge(delivered, 121 * second)[2]).toBe('bad noAnswer');
  });

  it('takes an answer that only the catch-up found for no proof of the signature', () => {
    expect(judge(sent, 20 * second, { after: second, late: 90 * second })[3]).toBe('waiting proof');
    expect(judge(sent, 20 * second, { after: second })[3]).toBe('good');
  });
});
