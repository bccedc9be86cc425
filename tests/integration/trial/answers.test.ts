import { describe, expect, it } from 'vitest';
import { readAnswers, saveAnswer } from '../../../src/features/trial/answers.service.ts';
import { saveAnswerSchema } from '../../../src/features/trial/saved-answers.schema.ts';
import { newId } from '../../../src/server/ids.ts';
import { buildPerson } from '../../builders/shop.ts';
import { refusalOf } from '../people/people-fixture.ts';
import { act, buildDraft, buildPlanned, buildTrialShop, noHazard, read, save } from './trial-fixture.ts';

describe('saving an answer', () => {
  it('counts versions question by question, and names the trial after what is typed', async () => {
    const shop = await buildTrialShop();
    const id = await buildDraft(shop, {});
    expect((await save(shop, id, 'job', { machine: 'Line 3' })).version).toBe(1);
    expect((await save(shop, id, 'result', { name: 'seal strength' })).version).toBe(1);
    const saved = await save(shop, id, 'job', { machine: ' Line 4 ' });
    expect(saved).toMatchObject({ question: 'job', version: 2, savedBy: 'Dana', state: 'draft' });
    const shown = await read(shop, id);
    expect(shown).toMatchObject({
      title: 'Line 4, seal strength',
      machine: 'Line 4',
      number: 1,
      mayWrite: true,
    });
    expect(shown.questions.job).toMatchObject({ version: 2, content: { machine: ' Line 4 ' } });
  });

  it('never overwrites what another tab saved: both texts are shown', async () => {
    const shop = await buildTrialShop();
    const id = await buildDraft(shop, {});
    await save(shop, id, 'worth', { change: '3' });
    const other = await shop.add(['supervisor'], { name: 'Lee' });
    const wish = { trialId: id, question: 'worth', save: newId(), base: 1 } as const;
    await saveAnswer(shop.as(other), { ...wish, content: { change: '4' } }, other);
    const late = saveAnswer(shop.scope, { ...wish, save: newId(), content: { change: '5' } }, shop.dana);
    const refusal = await refusalOf(late);
    expect(refusal.code).toBe('changed-meanwhile');
    expect(refusal.present).toMatchObject({ version: 2, content: { change: '4' }, savedBy: 'Lee' });
    // Another question is nobody's conflict.
    expect((await save(shop, id, 'value', { partsPerWeek: '10' })).version).toBe(1);
  });

  it('takes a save that is sent again, and one that says the same, whatever it was built on', async () => {
    const shop = await buildTrialShop();
    const id = await buildDraft(shop, {});
    const wish = {
      trialId: id,
      question: 'worth',
      content: { change: '3' },
      base: 0,
      save: newId(),
    } as const;
    const first = await saveAnswer(shop.scope, wish, shop.dana);
    await save(shop, id, 'worth', { change: '4' });
    expect((await saveAnswer(shop.scope, wish, shop.dana)).version).toBe(2);
    const equal = { ...wish, content: { change: '4' }, save: newId() };
    expect((await saveAnswer(shop.scope, equal, shop.dana)).version).toBe(2);
    expect(first.version).toBe(1);
    expect((await read(shop, id)).questions.worth?.content).toEqual({ change: '4' });
  });

  it('refuses what was built on a version that never was', async () => {
    const shop = await buildTrialShop();
    const id = await buildDraft(shop, {});
    const refusal = await refusalOf(save(shop, id, 'worth', { change: '3' }, 4));
    expect(refusal.present).toMatchObject({ version: 0, content: null });
  });

  it('checks the shape of what is sent, field by field', () => {
    const wish = { question: 'worth', base: 0, save: newId() };
    expect(saveAnswerSchema.safeParse({ ...wish, content: { change: 3 } }).error?.issues[0]?.path).toEqual([
      'content',
      'change',
    ]);
    expect(saveAnswerSchema.safeParse({ ...wish, content: { chance: '3' } }).success).toBe(false);
    expect(saveAnswerSchema.safeParse({ ...wish, content: { change: 'about three' } }).success).toBe(true);
  });

  it('stops when the trial starts: the rows are then unchangeable for anybody', async () => {
    const shop = await buildTrialShop();
    const id = await buildPlanned(shop, noHazard);
    await act(shop, id, 'start');
    const refusal = await refusalOf(save(shop, id, 'worth', { change: '9' }));
    expect(refusal.code).toBe('not-now');
    const row = () => shop.scope.db('answers').where({ trial_id: id });
    await expect(row().update({ document: '{}' })).rejects.toThrow(/only grows/);
    await expect(row().delete()).rejects.toThrow(/only grows/);
    expect((await read(shop, id)).mayWrite).toBe(false);
  });

  it('is for supervisors; engineers and admins read along; another shop finds nothing', async () => {
    const shop = await buildTrialShop();
    const id = await buildDraft(shop, { worth: { change: '3' } });
    const engineer = await shop.add(['engineer']);
    expect((await readAnswers(shop.as(engineer), id, engineer)).mayWrite).toBe(false);
    const wish = {
      trialId: id,
      question: 'worth',
      content: { change: '4' },
      base: 1,
      save: newId(),
    } as const;
    expect((await refusalOf(saveAnswer(shop.as(engineer), wish, engineer))).code).toBe('forbidden');
    const other = await buildTrialShop();
    expect((await refusalOf(readAnswers(other.scope, id, other.dana))).code).toBe('not-found');
    expect((await refusalOf(saveAnswer(other.scope, wish, other.dana))).code).toBe('not-found');
    expect(await buildPerson(shop.scope, ['operator'])).toBeTruthy();
  });
});
