import { screen, within } from '@testing-library/react';
import { userEvent } from '@testing-library/user-event';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { finishedAnswers } from '../../../../../tests/builders/answers.ts';
import {
  crewMember,
  nothingSoFar,
  renderInWizard,
  wizardShop,
} from '../../../../../tests/builders/in-wizard.tsx';
import { reviewFor, standingFor } from '../../../../../tests/builders/standing.ts';
import type { Proposal } from '../../../../lib/doe/index.ts';
import type { Answers } from '../../answers.schema.ts';
import type { PublicAnswers } from '../../saved-answers.schema.ts';
import type { SoFar } from '../wizard-context.ts';
import { StartActions } from './StartActions.tsx';
import { StartQuestions } from './StartQuestions.tsx';
import { StandingContext, useStandingOf } from './standing.tsx';

const shop = wizardShop({
  people: [
    crewMember({ id: 'somebody', name: 'Ana' }),
    crewMember({ id: 'sam', name: 'Sam', roles: ['engineer'] }),
  ],
});
const bare = finishedAnswers();
const { plan } = standingFor(bare);
const decided: Answers = {
  ...bare,
  look: { mixes: plan?.hardest.map(({ ends }) => ({ ends, decision: 'runBefore' })) ?? [] },
};

/** What the page asked of the server: method, path and body. */
const calls: [string, string, unknown][] = [];
let server: PublicAnswers;

beforeEach(() => {
  calls.length = 0;
  vi.stubGlobal('fetch', async (path: string, { method, body }: { method: string; body?: string }) => {
    calls.push([method, path, body === undefined ? undefined : JSON.parse(body)]);
    const { resolution, ...proposal } = server.plan?.proposal ?? {};
    const sent = { ...server, plan: { ...server.plan, proposal: { ...proposal, resolution: null } } };
    return Response.json(path.includes('/reviews/') ? server.review : sent);
  });
});
afterEach(() => vi.unstubAllGlobals());

function Page({ first, isPlanner = true }: { first: PublicAnswers; isPlanner?: boolean }) {
  const standing = useStandingOf(first, { isPlanner, readerId: 'dana' });
  return (
    <StandingContext value={standing}>
      <main>
        <StartQuestions />
        <StartActions />
      </main>
    </StandingContext>
  );
}

function open(answers: Answers, more: Partial<PublicAnswers> = {}) {
  server = standingFor(answers, more);
  return renderInWizard(<Page first={server} />, { answers, shop });
}

function line(number: number): HTMLElement {
  const [list] = screen.getAllByRole('list');
  const found = list && within(list).getAllByRole('listitem')[number - 1];
  if (!found) throw new Error(`there is no line ${number}`);
  return found;
}

describe('the last page', () => {
  it('says every page in one line, each leading back', () => {
    open(decided);
    expect(line(1)).toHaveTextContent('Line 3: seal strength, higher is better');
    expect(line(2)).toHaveTextContent('About 35 N on a normal day. Worth it from 3,5 N.');
    expect(line(3)).toHaveTextContent('JAW TEMP 140 C to 160 °C');
    expect(line(3)).toHaveTextContent('Film Supplier A or Supplier B');
    expect(line(4)).toHaveTextContent('Stop on: Smoke or a burnt smell and Someone is hurt.');
    expect(line(4)).toHaveTextContent('1 mix is never run.');
    expect(line(5)).toHaveTextContent(
      'Keep the same: Material batch, Shift, Gauge or who measures, and Crew.',
    );
    expect(line(7)).toHaveTextContent('Day: Ana');
    const back = within(line(4)).getByRole('link', { name: 'Change Safety' });
    expect(back).toHaveAttribute('href', '/trials/trial/safety');
  });

  it('names a gap with its fix, and starts nothing while there is one', async () => {
    open({ ...decided, call: { lines: [] }, ready: { ticked: [] } });
    expect(line(4)).toHaveTextContent('Whom to call: Please fill this in.');
    await userEvent.click(screen.getByRole('button', { name: 'Start the trial' }));
    expect(screen.getByText(/2 things are still to do/)).toBeVisible();
    expect(screen.queryByRole('alertdialog')).toBeNull();
    expect(calls).toEqual([]);
  });

  it('asks once more before the start, and says what is fixed from here', async () => {
    open(decided);
    await userEvent.click(screen.getByRole('button', { name: 'Start the trial' }));
    const dialog = screen.getByRole('alertdialog');
    expect(dialog).toHaveTextContent('From here the question and the worth-it number are fixed.');
    server = { ...server, state: 'running', mayWrite: false };
    await userEvent.click(within(dialog).getByRole('button', { name: 'Start the trial' }));
    await screen.findByText('The trial has started.');
    expect(calls).toContainEqual(['POST', '/api/trials/trial/events', { event: 'start', revision: 1 }]);
  });
});

describe('the hardest runs', () => {
  it('hang there as tags, each to be decided on, and nobody ticks "safe"', async () => {
    const { answers } = open(bare);
    const [first] = plan?.hardest ?? [];
    const group = screen.getByRole('group', { name: `What do you say to run ${first?.order}?` });
    expect(
      within(group)
        .getAllByRole('radio')
        .map((radio) => radio.getAttribute('value')),
    ).toEqual(['runBefore', 'engineerAgrees', 'ruledOut']);
    expect(screen.getByRole('article', { name: `Run ${first?.order}` })).toHaveTextContent('JAW TEMP');
    await userEvent.click(within(group).getByRole('radio', { name: 'We have run this before' }));
    expect(answers().look?.mixes).toEqual([{ ends: first?.ends, decision: 'runBefore' }]);
  });

  /** Rules out the first of the hardest runs; the plans beside the page know of it already. */
  async function ruleOut(proposals: readonly Proposal[]) {
    const [first] = free?.hardest ?? [];
    const brief = { forbidden: [ruleOf(first?.ends ?? {})] } as SoFar['brief'];
    server = standingFor(freeAnswers);
    const soFar = { ...nothingSoFar, brief, proposals };
    renderInWizard(<Page first={server} />, { answers: freeAnswers, shop, soFar });
    const ruledOut = { ends: first?.ends ?? {}, decision: 'ruledOut' } as const;
    if (proposals.length > 0)
      server = standingFor({ ...freeAnswers, look: { mixes: [ruledOut] } }, { revision: 3 });
    const group = screen.getByRole('group', { name: `What do you say to run ${first?.order}?` });
    await userEvent.click(within(group).getByRole('radio', { name: 'Rule it out' }));
    return server.plan;
  }

  it('make the plan again once one is ruled out', async () => {
    const proposals = standingFor(freeAnswers).plan?.proposal;
    const again = await ruleOut(proposals ? [proposals] : []);
    await screen.findByText('The plan was made again. Look at its hardest runs.');
    expect(calls).toContainEqual([
      'POST',
      '/api/trials/trial/plan',
      { revision: 3, proposalId: free?.proposalId },
    ]);
    expect(again?.hardest).not.toEqual(free?.hardest);
    expect(screen.getByRole('heading', { name: 'Ruled out' })).toBeVisible();
  });

  it('say so where no plan is left without it', async () => {
    await ruleOut([]);
    expect(await screen.findByText(/^No plan works without that mix/)).toBeVisible();
    expect(calls.filter(([method]) => method === 'POST')).toEqual([]);
  });
});

const freeAnswers: Answers = { ...bare, neverRun: { mixes: [] } };
const { plan: free } = standingFor(freeAnswers);

function ruleOf(ends: Readonly<Record<string, 'low' | 'high'>>): Record<string, number> {
  const ids = free?.settingIds ?? [];
  const entries = Object.entries(ends).map(([id, end]) => {
    return [String.fromCharCode(65 + ids.indexOf(id)), end === 'high' ? 1 : -1] as const;
  });
  return Object.fromEntries(entries);
}

describe('with an engineer', () => {
  it('goes there first where the rules say so; the list at the machine comes later', async () => {
    open({ ...decided, ready: { ticked: [] } }, { reviewDue: true, secondPerson: 'needed' });
    server = { ...server, state: 'plan review', mayWrite: false, review: reviewFor() };
    await userEvent.click(screen.getByRole('button', { name: 'Send to engineer' }));
    expect(await screen.findByText(/^Sam has it since Mar 12, 2026/)).toBeVisible();
    expect(calls).toContainEqual([
      'POST',
      '/api/trials/trial/events',
      { event: 'send for review', revision: 1 },
    ]);
  });

  it('is taken back by whoever plans', async () => {
    const waiting = { state: 'plan review', mayWrite: false, review: reviewFor(), reviewDue: true } as const;
    open(decided, waiting);
    server = { ...server, state: 'draft', mayWrite: true, review: reviewFor({ state: 'taken back' }) };
    await userEvent.click(screen.getByRole('button', { name: 'Take it back' }));
    expect(await screen.findByRole('button', { name: 'Send to engineer' })).toBeVisible();
    expect(calls).toContainEqual(['POST', '/api/reviews/review/take-back', { round: 1 }]);
  });

  it('comes back with each remark at its line, until it is dealt with', async () => {
    const comment = {
      id: 'a',
      place: '#/settings/settings/0',
      words: '160 is too hot',
      by: 'Sam',
      at: 0,
      settledAt: null,
    };
    const review = reviewFor({ state: 'sent back', decidedBy: 'Sam', decidedAt: 0, comments: [comment] });
    open(decided, { review, reviewDue: true });
    expect(screen.getByText(/^Sam sent it back/)).toBeVisible();
    expect(line(3)).toHaveTextContent('Sam: 160 is too hot');
    server = { ...server, review: { ...review, comments: [{ ...comment, settledAt: 1 }] } };
    await userEvent.click(within(line(3)).getByRole('button', { name: 'Done with it' }));
    await vi.waitFor(() => expect(line(3)).not.toHaveTextContent('160 is too hot'));
    expect(calls).toContainEqual(['PATCH', '/api/reviews/review/comments', { id: 'a', settled: true }]);
  });

  it('says where nobody else can look that nobody else did', () => {
    open(decided, { secondPerson: 'alone' });
    expect(screen.getByText('Not checked by a second person')).toBeVisible();
    expect(screen.getByRole('button', { name: 'Start the trial' })).toBeVisible();
  });
});
