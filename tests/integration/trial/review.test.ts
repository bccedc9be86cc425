import { describe, expect, it } from 'vitest';
import { erasePerson } from '../../../src/features/people/erase.service.ts';
import { decideReview } from '../../../src/features/trial/review.service.ts';
import { addComment, settleComment } from '../../../src/features/trial/review-comments.service.ts';
import { newId } from '../../../src/server/ids.ts';
import { admin, refusalOf, waitingMessages } from '../people/people-fixture.ts';
import { act, buildPlanned, buildTrialShop, decide, read, save } from './trial-fixture.ts';

describe('sending a plan for review', () => {
  it('tells those who may agree, by mail and by text, and nobody else', async () => {
    const shop = await buildTrialShop();
    const phone = { phone: '+12025550191', consent: 'agreed' };
    const sam = await shop.add(['engineer'], { name: 'Sam', ...phone });
    const kim = await shop.add(['supervisor'], { safety_person: true });
    const gone = await shop.add(['engineer'], { active: false });
    const admins = await shop.add(['admin']);
    const id = await buildPlanned(shop);
    const shown = await act(shop, id, 'send for review');
    expect(shown).toMatchObject({
      state: 'plan review',
      mayWrite: false,
      secondPerson: 'needed',
      reviewDue: true,
    });
    expect(shown.review).toMatchObject({
      round: 1,
      state: 'asked',
      askedBy: 'Dana',
      holds: false,
      mayDecide: false,
    });
    expect(await waitingMessages(shop.scope, sam.personId)).toEqual(['planWaiting', 'planWaitingText']);
    expect(await waitingMessages(shop.scope, kim.personId)).toEqual(['planWaiting']);
    for (const other of [gone, admins, shop.dana]) {
      expect(await waitingMessages(shop.scope, other.personId)).toEqual([]);
    }
    expect((await read(shop, id, sam)).review?.mayDecide).toBe(true);
    expect((await read(shop, id, kim)).review?.mayDecide).toBe(true);
  });

  it('needs complete answers, a plan that fits and somebody else who could look', async () => {
    const shop = await buildTrialShop();
    const id = await buildPlanned(shop);
    expect((await refusalOf(act(shop, id, 'send for review'))).code).toBe('no-reviewer');
    await shop.add(['engineer']);
    await save(shop, id, 'worth', { change: '4' });
    await save(shop, id, 'call', { lines: [] });
    expect((await refusalOf(act(shop, id, 'send for review'))).fields).toEqual([
      { pointer: '#/call/lines', code: 'missing' },
      { pointer: '#/plan', code: 'choose-plan' },
    ]);
    expect((await read(shop, id)).state).toBe('draft');
  });

  it('does not wait for the list that is ticked right before the start', async () => {
    const shop = await buildTrialShop();
    await shop.add(['engineer']);
    const id = await buildPlanned(shop, { ready: { ticked: [] } });
    expect((await act(shop, id, 'send for review')).state).toBe('plan review');
  });
});

describe('deciding', () => {
  it('is never up to whoever asked, nor to an admin or a supervisor', async () => {
    const shop = await buildTrialShop();
    const both = await shop.add(['supervisor', 'engineer']);
    const other = await shop.add(['supervisor']);
    const admins = await shop.add(['admin']);
    await shop.add(['engineer']);
    const id = await buildPlanned(shop);
    await act(shop, id, 'send for review', both);
    for (const decision of ['approve', 'send-back'] as const) {
      expect((await refusalOf(decide(shop, id, decision, both))).code).toBe('own-review');
      for (const reader of [other, admins, shop.dana]) {
        expect((await refusalOf(decide(shop, id, decision, reader))).code).toBe('forbidden');
      }
    }
    expect((await read(shop, id, both)).review?.mayDecide).toBe(false);
  });

  it('approves exactly what stands, tells who asked, and lapses with the next changed answer', async () => {
    const shop = await buildTrialShop();
    const sam = await shop.add(['engineer'], { name: 'Sam' });
    const id = await buildPlanned(shop);
    await act(shop, id, 'send for review');
    const approved = await decide(shop, id, 'approve', sam);
    expect(approved).toMatchObject({ state: 'approved', decidedBy: 'Sam', holds: true });
    expect(await waitingMessages(shop.scope, shop.dana.personId)).toEqual([
      'planApproved',
      'planApprovedText',
    ]);
    expect(await read(shop, id)).toMatchObject({ state: 'ready', mayWrite: true });
    // When it runs is no reason to look again.
    expect((await save(shop, id, 'pace', { next: 'go', startTime: '10:00' })).state).toBe('ready');
    expect((await save(shop, id, 'ready', { ticked: [] })).state).toBe('ready');
    expect((await save(shop, id, 'parts', { fate: 'hold', label: 'HOLD' })).state).toBe('ready');
    expect((await save(shop, id, 'parts', { fate: 'throwAway' })).state).toBe('draft');
    expect((await read(shop, id)).review).toMatchObject({ state: 'approved', holds: false });
    expect((await refusalOf(act(shop, id, 'start'))).code).toBe('invalid');
    const again = await act(shop, id, 'send for review');
    expect(again.review).toMatchObject({ round: 2, state: 'asked' });
  });

  it('is refused for an older round, and once it is decided', async () => {
    const shop = await buildTrialShop();
    const sam = await shop.add(['engineer']);
    const id = await buildPlanned(shop);
    const { review } = await act(shop, id, 'send for review');
    const first = { id: review?.id ?? '', round: 1 };
    await decide(shop, id, 'take-back', shop.dana);
    expect(await read(shop, id)).toMatchObject({ state: 'draft', review: { state: 'taken back' } });
    await act(shop, id, 'send for review');
    const late = decideReview(shop.as(sam), { ...first, decision: 'approve' }, sam);
    expect((await refusalOf(late)).code).toBe('changed-meanwhile');
    await decide(shop, id, 'approve', sam);
    expect((await refusalOf(decide(shop, id, 'send-back', sam))).code).toBe('not-now');
  });

  it('finds no review of another shop', async () => {
    const shop = await buildTrialShop();
    await shop.add(['engineer']);
    const id = await buildPlanned(shop);
    const { review } = await act(shop, id, 'send for review');
    const other = await buildTrialShop();
    const spy = await other.add(['engineer', 'supervisor', 'admin']);
    const which = { id: review?.id ?? '', round: 1, decision: 'approve' } as const;
    expect((await refusalOf(decideReview(other.as(spy), which, spy))).code).toBe('not-found');
    const remark = { reviewId: which.id, id: newId(), place: '#/worth', words: 'Hello' };
    expect((await refusalOf(addComment(other.as(spy), remark, spy))).code).toBe('not-found');
  });
});

describe('remarks', () => {
  it('stand at their line over all rounds, are settled, and are blanked when their writer is erased', async () => {
    const shop = await buildTrialShop();
    const sam = await shop.add(['engineer'], { name: 'Sam' });
    const admins = await shop.add(['admin']);
    const id = await buildPlanned(shop);
    const { review } = await act(shop, id, 'send for review');
    const reviewId = review?.id ?? '';
    const remark = { reviewId, id: newId(), place: '#/settings/settings/0/high', words: 'Sam says: too hot' };
    await addComment(shop.as(sam), remark, sam);
    expect((await addComment(shop.as(sam), remark, sam)).comments).toHaveLength(1);
    const forbidden = addComment(shop.as(admins), { ...remark, id: newId() }, admins);
    expect((await refusalOf(forbidden)).code).toBe('forbidden');
    await decide(shop, id, 'send-back', sam);
    expect(await waitingMessages(shop.scope, shop.dana.personId)).toEqual([
      'planSentBack',
      'planSentBackText',
    ]);
    const settled = await settleComment(shop.scope, { reviewId, id: remark.id, settled: true }, shop.dana);
    expect(settled.comments[0]).toMatchObject({ by: 'Sam', place: remark.place, words: remark.words });
    expect(settled.comments[0]?.settledAt).not.toBeNull();
    await act(shop, id, 'send for review');
    expect((await read(shop, id)).review?.comments).toHaveLength(1);
    const unknown = settleComment(shop.scope, { reviewId, id: newId(), settled: true }, shop.dana);
    expect((await refusalOf(unknown)).code).toBe('not-found');
    await erasePerson(shop.as(admins), { id: sam.personId, revision: 1 }, admin);
    const [left] = (await read(shop, id)).review?.comments ?? [];
    expect(left).toMatchObject({ words: '', by: 'former colleague 1' });
  });
});
