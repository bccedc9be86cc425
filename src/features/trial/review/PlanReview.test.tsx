import { render, screen, within } from '@testing-library/react';
import { userEvent } from '@testing-library/user-event';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { finishedAnswers } from '../../../../tests/builders/answers.ts';
import { wizardShop } from '../../../../tests/builders/in-wizard.tsx';
import { reviewFor, standingFor } from '../../../../tests/builders/standing.ts';
import { wordsFor } from '../../../i18n/resources.ts';
import type { PublicReview } from '../review.schema.ts';
import { PlanReview } from './PlanReview.tsx';

const calls: [string, string, unknown][] = [];
let answer: PublicReview;

beforeEach(() => {
  calls.length = 0;
  vi.stubGlobal('fetch', async (path: string, { method, body }: { method: string; body: string }) => {
    calls.push([method, path, JSON.parse(body)]);
    return Response.json(answer);
  });
});
afterEach(() => vi.unstubAllGlobals());

function open(review: PublicReview | null): void {
  const first = standingFor(finishedAnswers(), { review, state: 'plan review', mayWrite: false });
  const words = wordsFor('en', ['plan-review', 'wizard-safety', 'safety', 'errors']);
  render(<PlanReview language="en" words={words} first={first} shop={wizardShop()} />);
}

function remark(words: string): PublicReview['comments'][number] {
  return { id: 'a', place: '#/stop', words, by: 'Sam', at: 0, settledAt: null };
}

describe('the review of a plan', () => {
  it('says the plan in the supervisor’s words and in audit terms', () => {
    open(reviewFor({ mayDecide: true }));
    const settings = screen.getByRole('region', { name: 'The settings' });
    expect(settings).toHaveTextContent('JAW TEMP 140 C to 160 °C');
    const safety = screen.getByRole('region', { name: 'What protects people' });
    expect(safety).toHaveTextContent('Hot parts, in place: Guards are closed');
    expect(safety).toHaveTextContent('JAW TEMP 160 °C and Dwell 1 s: 2 of 8 corners');
    const audit = screen.getByRole('region', { name: 'The plan in audit terms' });
    expect(audit).toHaveTextContent('A = JAW TEMP');
    expect(audit).toHaveTextContent('Error estimate');
    expect(audit).toHaveTextContent('Detectable effect');
    expect(within(audit).getAllByRole('row').length).toBeGreaterThan(8);
  });

  it('is approved after a question', async () => {
    open(reviewFor({ mayDecide: true }));
    answer = reviewFor({ state: 'approved', holds: true, decidedBy: 'Sam', decidedAt: 0 });
    await userEvent.click(screen.getByRole('button', { name: 'Approve' }));
    const dialog = screen.getByRole('alertdialog');
    await userEvent.click(within(dialog).getByRole('button', { name: 'Approve' }));
    expect(await screen.findByText(/^Sam approved it/)).toBeVisible();
    expect(calls).toEqual([['POST', '/api/reviews/review/approve', { round: 1 }]]);
    expect(screen.queryByRole('button', { name: 'Send back' })).toBeNull();
  });

  it('is sent back with at least one remark', async () => {
    open(reviewFor({ mayDecide: true }));
    await userEvent.click(screen.getByRole('button', { name: 'Send back' }));
    expect(screen.getByText('Say at a line what must change. Then send it back.')).toBeVisible();
    expect(calls).toEqual([]);
    await userEvent.click(screen.getByRole('button', { name: 'Remark Stop rule' }));
    const field = screen.getByRole('textbox', { name: 'Remark on: Stop rule' });
    await userEvent.click(screen.getByRole('button', { name: 'Add the remark' }));
    expect(field).toHaveAccessibleDescription('Write what should change.');
    await userEvent.type(field, 'Add the burnt smell');
    answer = reviewFor({ mayDecide: true, comments: [remark('Add the burnt smell')] });
    await userEvent.click(screen.getByRole('button', { name: 'Add the remark' }));
    expect(await screen.findByText('Add the burnt smell')).toBeVisible();
    answer = reviewFor({ state: 'sent back', decidedBy: 'Sam', decidedAt: 0, comments: answer.comments });
    await userEvent.click(screen.getByRole('button', { name: 'Send back' }));
    expect(await screen.findByText(/^Sam sent it back/)).toBeVisible();
    expect(calls.map(([method, path]) => `${method} ${path}`)).toEqual([
      'POST /api/reviews/review/comments',
      'POST /api/reviews/review/send-back',
    ]);
    expect(calls[0]?.[2]).toMatchObject({ place: '#/stop', words: 'Add the burnt smell' });
  });

  it('is not decided by whoever asked for it', () => {
    open(reviewFor({ mayDecide: false }));
    expect(screen.getByText('Somebody else must agree')).toBeVisible();
    expect(screen.queryByRole('button', { name: 'Approve' })).toBeNull();
    expect(screen.queryByRole('button', { name: /^Remark/ })).toBeNull();
  });
});
