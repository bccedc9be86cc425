import { configure, fireEvent, screen, waitFor, within } from '@testing-library/react';
import { userEvent } from '@testing-library/user-event';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { finishedAnswers } from '../../../../../tests/builders/answers.ts';
import { renderInWizard, shownTrialId } from '../../../../../tests/builders/in-wizard.tsx';
import { proposePlans } from '../../../../lib/doe/index.ts';
import type { Answers } from '../../answers.schema.ts';
import { toBrief } from '../../to-brief.ts';
import { PlanQuestions } from './PlanQuestions.tsx';

const trial = {
  trialId: shownTrialId,
  number: 1,
  title: 'Line 3 seals',
  machine: 'Line 3',
  state: 'draft',
  phase: 'main',
  revision: 7,
  mayWrite: true,
  questions: {},
  plan: null as object | null,
  review: null,
  reviewDue: false,
  secondPerson: 'not needed',
};

function planOf(proposalId: string, fits: boolean) {
  const read = toBrief(finishedAnswers());
  if ('problems' in read) throw new RangeError('finishedAnswers are not finished');
  const [proposal] = proposePlans(read.brief);
  return { n: 1, proposalId, proposal, settingIds: [], runs: [], hardest: [], hash: 'x', fits };
}

// A machine that does other work besides must not fail a test for being slow.
configure({ asyncUtilTimeout: 15_000 });

/** What was asked of the server: a choice is answered with its plan. */
let asked: { path: string; body: unknown }[];
let kept: object | null;
beforeEach(() => {
  asked = [];
  kept = null;
  vi.stubGlobal('fetch', async (path: string, call: { method: string; body?: string }) => {
    const body = call.body ? JSON.parse(call.body) : null;
    if (call.method === 'POST') {
      asked.push({ path, body });
      kept = planOf(body.proposalId, true);
    }
    return Response.json({ ...trial, plan: kept });
  });
});
afterEach(() => vi.unstubAllGlobals());

function renderPlans(more: Answers = {}) {
  const answers = finishedAnswers({ neverRun: { mixes: [] }, ...more });
  return renderInWizard(<PlanQuestions />, {
    answers,
    namespaces: ['wizard-plan', 'plan-facts', 'trials'],
    soFar: 'worked out',
  });
}

const cards = () => screen.getAllByRole('article');

describe('picking a plan', () => {
  it('shows each plan with its runs, its promise in the unit of the result, and one that we would take', () => {
    renderPlans();
    const [first, ...others] = cards();
    if (!first) throw new RangeError('no card');
    expect(within(first).getByRole('heading').textContent).toBe('We would take this one');
    expect(first.textContent).toMatch(/Would spot a change of [\d.]+ N or more\./);
    expect(first.textContent).toMatch(/Your gain of 3\.5 N: found about \d times in 10\./);
    expect(first.textContent).toContain('Why this one:');
    expect(within(first).getAllByRole('img').length).toBeGreaterThan(3);
    expect(within(first).getAllByRole('img')[0]?.getAttribute('aria-label')).toMatch(
      /Run 1: Jaw temp 1[456]0/,
    );
    for (const card of others) expect(card.textContent).not.toContain('We would take this one');
  });

  it('re-deals when a slider moves, and says how many plans fit', () => {
    const told = renderPlans();
    const runs = screen.getByRole('slider', { name: 'Runs' });
    fireEvent.change(runs, { target: { value: '8' } });
    expect(told.answers().spare?.runs).toBe('8');
    for (const card of cards()) expect(card.textContent).toMatch(/[4-8] runs/);
    expect(screen.getByText(/plans? fits?\./)).toBeInTheDocument();
  });

  it('says which limit is too tight, and one press mends it', async () => {
    const told = renderPlans({ spare: { runs: '20', hours: '1', minutesPerRun: '30', moneyOpen: true } });
    expect(screen.queryAllByRole('article')).toEqual([]);
    expect(screen.getByText(/No plan fits in this time/)).toBeInTheDocument();
    await userEvent.click(screen.getByRole('button', { name: /Allow \d+ hours/ }));
    expect(Number(told.answers().spare?.hours)).toBeGreaterThan(1);
    expect(cards().length).toBeGreaterThan(0);
  });

  it('says how many runs so many settings need', async () => {
    const { settings = [] } = finishedAnswers().settings ?? {};
    const choice = { kind: 'choice', low: 'A', high: 'B', usual: 'low' } as const;
    const more = ['Belt', 'Fan'].map((name) => ({ ...choice, id: name, name }));
    const told = renderPlans({
      settings: { settings: [...settings, ...more] },
      spare: { runs: '4', hoursOpen: true, moneyOpen: true },
    });
    expect(
      screen.getByText(/No plan fits in 4 runs\. With 5 settings you need at least \d+\./),
    ).toBeInTheDocument();
    expect(screen.getByRole('link', { name: 'Drop a setting' })).toHaveAttribute(
      'href',
      `/trials/${trial.trialId}/settings`,
    );
    await userEvent.click(screen.getByRole('button', { name: /Allow \d+ runs/ }));
    expect(Number(told.answers().spare?.runs)).toBeGreaterThan(4);
  });

  it('takes a plan by its id on the present revision, and marks it', async () => {
    renderPlans();
    const [first] = screen.getAllByRole('button', { name: 'Take this plan' });
    if (!first) throw new RangeError('no button');
    await userEvent.click(first);
    await screen.findByText('You took this plan');
    expect(asked).toHaveLength(1);
    expect(asked[0]?.path).toBe(`/api/trials/${trial.trialId}/plan`);
    expect(asked[0]?.body).toMatchObject({ revision: 7 });
  });

  it('asks for another choice when the plan was made for other answers', async () => {
    kept = planOf('old', false);
    renderPlans();
    await screen.findByText('Take a plan again');
    expect(screen.queryByText('You took this plan')).toBeNull();
  });

  it('names the pages that a plan still waits for instead of a button that would fail', async () => {
    renderPlans({ limit: {} });
    const link = screen.getByRole('link', { name: 'Today' });
    expect(link).toHaveAttribute('href', `/trials/${trial.trialId}/today#to-do`);
    expect(screen.queryByRole('button', { name: 'Take this plan' })).toBeNull();
    await waitFor(() => expect(cards().length).toBeGreaterThan(0));
  });
});
