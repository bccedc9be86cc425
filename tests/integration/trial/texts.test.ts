import { describe, expect, it } from 'vitest';
import { previewTexts, sendPractice } from '../../../src/features/trial/texts-preview.service.ts';
import { database } from '../../../src/server/db/connection.ts';
import { buildPlanned, buildTrialShop } from './trial-fixture.ts';

describe('the texts of a planned trial', () => {
  it('are shown in each language of the crew, as long as they are', async () => {
    const shop = await buildTrialShop();
    const trialId = await buildPlanned(shop);
    const { texts, whole } = await previewTexts(shop.scope, trialId, shop.dana);
    expect(texts.map(({ language }) => language)).toEqual(['es']);
    const [text] = texts;
    expect(text?.body).toContain('JAW TEMP 1');
    expect(text?.body.split('\n')[0]).toMatch(/^Line 3/);
    expect(text?.segments).toBeGreaterThan(0);
    expect(text?.tooLong).toBeNull();
    expect(whole?.texts).toBeGreaterThan(4);
  });

  it('say which name to shorten where they are too long', async () => {
    const shop = await buildTrialShop();
    const machine = 'The packing line in the second hall beside the boiler, '.repeat(4).slice(0, 199).trim();
    const title = 'Line 3 seals';
    const trialId = await buildPlanned(shop, { job: { title, machine: machine } });
    const { texts } = await previewTexts(shop.scope, trialId, shop.dana);
    expect(texts[0]?.tooLong?.name).toBe(machine);
    expect(texts[0]?.tooLong?.letters).toBeGreaterThan(0);
  });

  it('reach the phone of whoever plans as practice, once a minute', async () => {
    const shop = await buildTrialShop();
    const trialId = await buildPlanned(shop);
    expect(await sendPractice(shop.scope, trialId, shop.dana)).toEqual({ outcome: 'queued' });
    const again = await sendPractice(shop.scope, trialId, shop.dana);
    expect(['already', 'queued']).toContain(again.outcome);
    const [message] = await database()('messages').where({ trial_id: trialId, template: 'practiceRun' });
    expect(message?.body).toMatch(/^PRACTICE\./);
    expect(message?.person_id).toBe(shop.dana.personId);
  });

  it('go to nobody who has no phone or has not said yes', async () => {
    const shop = await buildTrialShop();
    const trialId = await buildPlanned(shop);
    const lee = await shop.add(['supervisor'], { phone: null });
    const kim = await shop.add(['supervisor'], { phone: '+12025550177', consent: 'asked' });
    expect(await sendPractice(shop.as(lee), trialId, lee)).toEqual({ outcome: 'no phone' });
    expect(await sendPractice(shop.as(kim), trialId, kim)).toEqual({ outcome: 'no consent' });
    expect(await database()('messages').where({ trial_id: trialId, template: 'practiceRun' })).toEqual([]);
  });
});
