import sharp from 'sharp';
import { describe, expect, it } from 'vitest';
import { actOnPhone } from '../../../src/features/phone/phone-act.service.ts';
import type { PhoneForm } from '../../../src/features/phone/phone-form.schema.ts';
import { makePhoneLink } from '../../../src/features/phone/phone-link.service.ts';
import { readPhonePage } from '../../../src/features/phone/phone-page.service.ts';
import { addPhonePhoto } from '../../../src/features/phone/phone-photo.service.ts';
import { AppError } from '../../../src/server/errors.ts';
import { newId } from '../../../src/server/ids.ts';
import { buildRunningTrial } from '../../builders/measured-trial.ts';
import { buildPerson, buildShop } from '../../builders/shop.ts';

let networks = 0;

/** A trial of which Ana has the first run in hand, and the way to her phone page. */
async function handOut() {
  const scope = await buildShop();
  const ownerId = await buildPerson(scope, ['supervisor']);
  const ana = await buildPerson(scope, ['operator'], { name: 'Ana', phone: '+12025550142', language: 'es' });
  const trialId = await buildRunningTrial(scope, { ownerId });
  const { db, shopId } = scope;
  const first = await db('runs').where({ shop_id: shopId, trial_id: trialId, number: 1 }).first('id');
  await db('runs').where({ id: first.id }).update({ state: 'asked', person_id: ana, asked_at: 1 });
  const address = await makePhoneLink(scope, { personId: ana, trialId });
  networks += 1;
  const visit = { token: address.slice(address.lastIndexOf('/') + 1), network: `10.0.0.${networks}` };
  const press = (action: PhoneForm['action'], more: Record<string, string> = {}, submission = newId()) =>
    actOnPhone(visit, { action, run: first.id, submission, words: more['words'] ?? '' }, more);
  const stateOf = async (id: string) => (await db('runs').where({ id }).first('state')).state;
  return { scope, trialId, ana, visit, press, runId: first.id as string, stateOf };
}

const strengths = { 'r0-1': '36,1', 'r0-2': '35.9', 'r0-3': '36' };

describe('a phone page', () => {
  it('shows its person their own run, in their language, and changes nothing', async () => {
    const { visit, runId, stateOf } = await handOut();
    const view = await readPhonePage(visit);
    expect(view).toMatchObject({ language: 'es', machine: 'Line 3', run: { id: runId, number: 1 } });
    expect(view.run?.settings.map(({ name }) => name)).toEqual(['JAW TEMP', 'Dwell', 'Film']);
    expect(view.hazards).toEqual(['hotParts']);
    expect(await stateOf(runId)).toBe('asked');
  });

  it('takes the numbers with a decimal comma, once however often they are sent', async () => {
    const { scope, visit, press, runId, stateOf } = await handOut();
    const submission = newId();
    expect(await press('send', strengths, submission)).toBe('saved');
    expect(await press('send', strengths, submission)).toBe('behind');
    expect(await stateOf(runId)).toBe('done');
    const readings = await scope.db('readings').where({ run_id: runId }).orderBy('part');
    expect(readings.map(({ value, source }) => [value, source])).toEqual([
      [36.1, 'phone page'],
      [35.9, 'phone page'],
      [36, 'phone page'],
    ]);
    expect(await readPhonePage(visit)).toMatchObject({ run: null, last: { number: 1 } });
  });

  it('keeps what is there while some numbers are missing', async () => {
    const { press, runId, stateOf } = await handOut();
    expect(await press('send', { 'r0-1': '36' })).toBe('more');
    expect(await stateOf(runId)).toBe('asked');
  });

  it('names a field that is no number, and keeps nothing', async () => {
    const { scope, press, runId } = await handOut();
    const refusal = await press('send', { ...strengths, 'r0-2': 'about 36' }).catch(
      (error: unknown) => error,
    );
    expect(refusal).toBeInstanceOf(AppError);
    expect((refusal as AppError).fields).toEqual([{ pointer: '#/r0-2', code: 'not-a-number' }]);
    expect(await scope.db('readings').where({ run_id: runId })).toEqual([]);
  });

  it('lets a run be made, skipped or told about', async () => {
    const made = await handOut();
    expect(await made.press('made')).toBe('made');
    expect(await made.stateOf(made.runId)).toBe('made');
    const skipped = await handOut();
    expect(await skipped.press('skip')).toBe('skipped');
    expect(await skipped.stateOf(skipped.runId)).toBe('skipped');
    const told = await handOut();
    expect(await told.press('problem', { words: 'jaw not heating' })).toBe('told');
    const problems = await told.scope.db('problems').where({ trial_id: told.trialId });
    expect(problems.map(({ words }) => words)).toEqual(['jaw not heating']);
  });

  it('asks an odd number back once, as by text, and takes another one in its place', async () => {
    const { scope, ana, visit, press, runId, stateOf } = await handOut();
    const odd = { 'r0-1': '361', 'r0-2': '359', 'r0-3': '360' };
    expect(await press('send', odd)).toBe('odd');
    expect(await stateOf(runId)).toBe('doubtful');
    expect((await readPhonePage(visit)).run?.state).toBe('doubtful');
    const talk = await scope.db('conversations').where({ person_id: ana }).first();
    expect(talk).toMatchObject({ state: 'sure', run_id: runId });
    expect(await press('send', strengths)).toBe('saved');
    expect(await stateOf(runId)).toBe('done');

    const right = await handOut();
    await right.press('send', odd);
    expect(await right.press('right')).toBe('saved');
    expect(await right.stateOf(right.runId)).toBe('done');
  });

  it('puts off a run, and passes on how far a setting got', async () => {
    const { scope, trialId, press, runId, stateOf } = await handOut();
    expect(await press('later')).toBe('later');
    const { remind_at } = await scope.db('runs').where({ id: runId }).first('remind_at');
    expect(remind_at).toBeGreaterThan(Date.now());
    await expect(press('cannot')).rejects.toMatchObject({
      fields: [{ pointer: '#/words', code: 'missing' }],
    });
    const submission = newId();
    expect(await press('cannot', { words: 'JAW TEMP 155' }, submission)).toBe('asked');
    expect(await press('cannot', { words: 'JAW TEMP 155' }, submission)).toBe('asked');
    expect(await stateOf(runId)).toBe('asked');
    const problems = await scope.db('problems').where({ trial_id: trialId });
    expect(problems).toMatchObject([{ kind: 'cannot', run_id: runId, words: 'JAW TEMP 155' }]);
  });

  it('takes a picture of its person’s own run, and of nobody else’s', async () => {
    const { scope, trialId, visit, runId } = await handOut();
    const image = sharp({ create: { width: 20, height: 10, channels: 3, background: '#123456' } });
    const file = (content: Uint8Array) => new File([new Uint8Array(content)], 'photo.jpg');
    const picture = file(await image.jpeg().toBuffer());
    expect(await addPhonePhoto(visit, runId, picture)).toBe('photo');
    expect(await addPhonePhoto(visit, runId, picture)).toBe('photo');
    expect(await scope.db('photos').where({ run_id: runId })).toHaveLength(1);
    expect(await addPhonePhoto(visit, runId, file(new Uint8Array([1, 2, 3])))).toBe('photoRefused');
    expect(await addPhonePhoto(visit, runId, null)).toBe('photoRefused');
    const other = await scope.db('runs').where({ trial_id: trialId, number: 2 }).first('id');
    expect(await addPhonePhoto(visit, other.id, picture)).toBe('behind');
    await expect(addPhonePhoto({ ...visit, token: 'gone' }, runId, picture)).rejects.toMatchObject({
      code: 'gone',
    });
  });

  it('stops the trial on DANGER', async () => {
    const { scope, trialId, press, visit } = await handOut();
    expect(await press('danger')).toBe('stopped');
    expect(await scope.db('trials').where({ id: trialId }).first('state')).toEqual({ state: 'held' });
    expect(await readPhonePage(visit)).toMatchObject({ state: 'held', run: null });
  });

  it('does nothing with a run that is somebody else’s by now', async () => {
    const { scope, press, runId, stateOf } = await handOut();
    const other = await buildPerson(scope, ['operator']);
    await scope.db('runs').where({ id: runId }).update({ person_id: other });
    expect(await press('skip')).toBe('behind');
    expect(await stateOf(runId)).toBe('asked');
  });

  it('ends with its link, without a word about whose it was', async () => {
    const { visit, scope, ana } = await handOut();
    await scope.db('people').where({ id: ana }).update({ active: false });
    await expect(readPhonePage(visit)).rejects.toMatchObject({ code: 'gone' });
    await expect(readPhonePage({ ...visit, token: 'never-was' })).rejects.toMatchObject({ code: 'gone' });
  });
});
