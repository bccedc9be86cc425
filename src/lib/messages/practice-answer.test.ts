import { expect, it } from 'vitest';
import { isPracticeNumber } from './practice-answer.ts';

it('takes one number as the answer to the practice text', () => {
  for (const typed of ['41.5', ' 41,5 ', '41', '41.5 N', '-3', '41.5 sek.'])
    expect(isPracticeNumber(typed), typed).toBe(true);
  for (const typed of ['', 'ok', '41.5 40', '1,234,5', 'run 3 41.5', 'SKIP']) {
    expect(isPracticeNumber(typed), typed).toBe(false);
  }
});
