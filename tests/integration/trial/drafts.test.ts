import { describe, expect, it } from 'vitest';
import { listTrialsSchema } from '../../../src/features/trial/trial.schema.ts';
import {
  createTrial,
  deleteTrial,
  listTrials,
  putAwayTrial,
} from '../../../src/features/trial/trial.service.ts';
import { listActivity } from '../../../src/server/db/activity-log.ts';
import { newId } from '../../../src/server/ids.ts';
import { kindsAbout, refusalOf } from '../people/people-fixture.ts';
import {
  act,
  answersFor,
  buildDraft,
  buildPlanned,
  buildTrialShop,
  noHazard,
  read,
  type TrialShop,
  typedAnswers,
} from './trial-fixture.ts';

function list(shop: TrialShop, query: Record<string, unknown> = {}) {
  return listTrials(shop.scope, listTrialsSchema.parse(query));
}

describe('a new trial', () => {
  it('is made once however often it is asked for, and counts up in its shop', async () => {
    const shop = await buildTrialShop();
    const id = newId();
    const first = await createTrial(shop.scope, { id }, shop.dana);
    expect(first).toMatchObject({ id, number: 1, state: 'draft', ownerName: 'Dana', title: '' });
    expect(await createTrial(shop.scope, { id }, shop.dana)).toEqual(first);
    expect((await createTrial(shop.scope, { id: newId() }, shop.dana)).number).toBe(2);
    expect(await kindsAbout(shop.scope, id)).toEqual(['trial.added']);
    const other = await buildTrialShop();
    expect((await createTrial(other.scope, { id: newId() }, other.dana)).number).toBe(1);
    expect((await refusalOf(createTrial(other.scope, { id }, other.dana))).code).toBe('not-found');
    expect((await list(other)).trials).toHaveLength(1);
  });

  it('starts from an earlier one without what belonged to its day and its plan', async () => {
    const shop = await buildTrialShop();
    const pace = { next: 'go', startDate: '2026-12-01', startTime: '09:00' } as const;
    const source = await buildPlanned(shop, { pace });
    const id = newId();
    const copy = await createTrial(shop.scope, { id, copyOf: source }, shop.dana);
    expect(copy).toMatchObject({ title: 'Line 3 seals', machine: 'Line 3', number: 2 });
    const { look: _look, ready: _ready, ...kept } = answersFor(shop, { pace: { next: 'go' } });
    expect(await typedAnswers(shop, id)).toEqual(kept);
    expect(await read(shop, id)).toMatchObject({ plan: null, review: null });
    const other = await buildTrialShop();
    const foreign = createTrial(other.scope, { id: newId(), copyOf: source }, other.dana);
    expect((await refusalOf(foreign)).code).toBe('not-found');
  });
});

describe('the list of trials', () => {
  it('finds by title and machine without accents, sorts, and cuts into pages that continue', async () => {
    const shop = await buildTrialShop();
    for (const [title, machine] of [
      ['Łuki', 'Máquina 1'],
      ['Seals', 'Line 3'],
      ['50% more', 'Line 3'],
      ['Moulds', 'Press'],
    ]) {
      await buildDraft(shop, { job: { title, machine } });
    }
    const titles = async (query: Record<string, unknown>) =>
      (await list(shop, query)).trials.map(({ title }) => title);
    expect(await titles({ search: 'luki' })).toEqual(['Łuki']);
    expect(await titles({ search: 'maquina' })).toEqual(['Łuki']);
    expect(await titles({ search: '%' })).toEqual(['50% more']);
    expect(await titles({ search: 'line 3', sort: 'title', direction: 'ascending' })).toEqual([
      '50% more',
      'Seals',
    ]);
    const seen: string[] = [];
    for (const sort of ['number', 'changed', 'title', 'machine']) {
      seen.length = 0;
      let after: string | undefined;
      do {
        const page = await list(shop, {
          sort,
          direction: 'ascending',
          limit: 1,
          ...(after ? { after } : {}),
        });
        seen.push(...page.trials.map(({ title }) => title));
        after = page.next ?? undefined;
      } while (after);
      expect([sort, new Set(seen).size, seen.length]).toEqual([sort, 4, 4]);
    }
    expect(await titles({ after: 'nonsense' })).toHaveLength(4);
  });

  it('shows by state, and what was put away by itself', async () => {
    const shop = await buildTrialShop();
    const draft = await buildDraft(shop, {});
    const running = await buildPlanned(shop, noHazard);
    await act(shop, running, 'start');
    const ids = async (query: Record<string, unknown>) =>
      (await list(shop, query)).trials.map(({ id }) => id);
    expect(await ids({ state: 'running' })).toEqual([running]);
    expect(await ids({ state: 'planning' })).toEqual([draft]);
    expect(await ids({ state: 'closed' })).toEqual([]);
    const { revision } = await read(shop, draft);
    const away = await putAwayTrial(shop.scope, { id: draft, revision, putAway: true });
    expect(away.putAwayAt).not.toBeNull();
    expect(await ids({})).toEqual([running]);
    expect(await ids({ show: 'away' })).toEqual([draft]);
    const stale = putAwayTrial(shop.scope, { id: draft, revision, putAway: false });
    expect((await refusalOf(stale)).code).toBe('changed-meanwhile');
    await putAwayTrial(shop.scope, { id: draft, revision: away.revision, putAway: false });
    expect(await ids({})).toHaveLength(2);
    const held = putAwayTrial(shop.scope, {
      id: running,
      revision: (await read(shop, running)).revision,
      putAway: true,
    });
    expect((await refusalOf(held)).code).toBe('not-now');
  });
});

describe('deleting', () => {
  it('takes a draft away with all that hangs on it, and leaves a line in the log', async () => {
    const shop = await buildTrialShop();
    const engineer = await shop.add(['engineer']);
    const id = await buildPlanned(shop);
    await act(shop, id, 'send for review');
    const { review } = await read(shop, id);
    const { decideReview } = await import('../../../src/features/trial/review.service.ts');
    const decision = { id: review?.id ?? '', round: 1, decision: 'send-back' } as const;
    await decideReview(shop.as(engineer), decision, engineer);
    const { revision } = await read(shop, id);
    const early = deleteTrial(shop.scope, { id, revision: revision - 1 }, shop.dana);
    expect((await refusalOf(early)).code).toBe('changed-meanwhile');
    await deleteTrial(shop.scope, { id, revision }, shop.dana);
    for (const table of ['answers', 'plans', 'reviews', 'messages']) {
      expect(await shop.scope.db(table).where({ trial_id: id }), table).toEqual([]);
    }
    expect((await refusalOf(read(shop, id))).code).toBe('not-found');
    const [line] = await listActivity(shop.scope, { limit: 1, trialId: id });
    expect(line?.kind).toBe('trial.deleted');
  });

  it('is not for a trial that has started, nor for an engineer', async () => {
    const shop = await buildTrialShop();
    const engineer = await shop.add(['engineer']);
    const id = await buildPlanned(shop, noHazard);
    const { revision } = await read(shop, id);
    expect((await refusalOf(deleteTrial(shop.scope, { id, revision }, engineer))).code).toBe('forbidden');
    const started = await act(shop, id, 'start');
    const late = deleteTrial(shop.scope, { id, revision: started.revision }, shop.dana);
    expect((await refusalOf(late)).code).toBe('not-now');
  });
});
