import sharp from 'sharp';
import { describe, expect, it, vi } from 'vitest';
import { catchUpTexts } from '../../../src/features/message/catching-up.service.ts';
import { fetchMedia } from '../../../src/features/message/fetch-media.ts';
import { erasePerson } from '../../../src/features/people/erase.service.ts';
import { fetchPhotos } from '../../../src/features/run/fetch-photos.service.ts';
import { readPhoto, removePhoto } from '../../../src/features/run/photo.service.ts';
import { readBoard } from '../../../src/features/run/read-board.service.ts';
import { database } from '../../../src/server/db/connection.ts';
import { config } from '../../../src/server/env.ts';
import { buildShop } from '../../builders/shop.ts';
import { openCrew, passTime } from '../message/crew.ts';
import { lastText, type RunningShop, runNow, startTrial, work } from './text-fixture.ts';

const minute = 60_000;
const crew = openCrew();

async function jpeg(): Promise<{ type: string; base64: string }> {
  const image = sharp({ create: { width: 64, height: 48, channels: 3, background: '#336699' } });
  return { type: 'image/jpeg', base64: (await image.jpeg().toBuffer()).toString('base64') };
}

async function sendPicture(body = ''): Promise<void> {
  const { desk, phone, number } = crew;
  const pictures = [await jpeg()];
  const { sid } = await desk.textFromPhone({ from: phone, to: number, body, pictures });
  await vi.waitFor(async () => {
    expect(await database()('inbox_texts').where({ provider_id: sid })).toHaveLength(1);
  });
  await work(crew);
}

/** The job as the worker runs it, against the stand-in. */
function fetchNow(): Promise<number> {
  const { accountSid, authToken } = config().texts;
  const settings = {
    ...{ serviceUrl: crew.desk.textsUrl, accountSid, authToken, allowedHosts: [], isLive: false },
    ...{ limitBytes: 1_000_000, timeoutMilliseconds: 5_000 },
  };
  const fetch = (address: string) => fetchMedia(address, settings);
  return fetchPhotos(database(), { gateway: crew.desk.gateway, fetch });
}

async function photosOnBoard(shop: RunningShop, place = 1) {
  const board = await readBoard(shop.scope, shop.trialId, shop.dana);
  return board.runs[place - 1]?.photos ?? [];
}

describe('a picture by text', () => {
  it('stands with the run in hand, drawn anew, and is answered kindly', async () => {
    const shop = await startTrial(crew);
    await sendPicture();
    expect(await lastText(shop)).toBe(
      'Thanks. The picture goes with run 1. No people in the picture, please.',
    );
    expect(await fetchNow()).toBe(1);
    expect(await fetchNow()).toBe(0);
    const [photo] = await photosOnBoard(shop);
    expect(photo).toMatchObject({ width: 64, height: 48, by: 'Ana' });
    const kept = await sharp(await readPhoto(shop.scope, photo?.id ?? '')).metadata();
    expect(kept).toMatchObject({ format: 'jpeg', width: 64 });
    expect((await runNow(shop, 1)).state).toBe('asked');
  });

  it('may come with the reading, and then both are kept', async () => {
    const shop = await startTrial(crew);
    await passTime(10 * minute);
    await sendPicture('41.5');
    await fetchNow();
    expect((await runNow(shop, 1)).state).toBe('done');
    expect(await photosOnBoard(shop)).toHaveLength(1);
  });

  it('is found by asking where the webhook was missed', async () => {
    const shop = await startTrial(crew);
    await crew.desk.setFaults({ webhooks: 'off' });
    const pictures = [await jpeg()];
    await crew.desk.textFromPhone({ from: crew.phone, to: crew.number, body: '', pictures });
    await catchUpTexts(database(), crew.desk.gateway);
    await crew.desk.setFaults({ webhooks: 'on' });
    await work(crew);
    await fetchNow();
    expect(await photosOnBoard(shop)).toHaveLength(1);
  });

  it('is not asked for where its address points elsewhere', async () => {
    const shop = await startTrial(crew);
    await sendPicture();
    const media = {
      v: 1,
      items: [{ url: 'http://169.254.169.254/latest', type: 'image/jpeg' }],
      unlisted: 0,
    };
    await database()('inbox_texts')
      .where({ person_id: crew.ana })
      .update({ media: JSON.stringify(media) });
    await fetchNow();
    expect(await photosOnBoard(shop)).toEqual([]);
    const [text] = await database()('inbox_texts').where({ person_id: crew.ana });
    expect(text.photo_state).toBe('failed');
  });
});

describe('a picture on the board', () => {
  it('is another shop’s to nobody, can be taken away, and goes with the person who sent it', async () => {
    const shop = await startTrial(crew);
    await sendPicture();
    await fetchNow();
    const [photo] = await photosOnBoard(shop);
    const id = photo?.id ?? '';
    await expect(readPhoto(await buildShop(), id)).rejects.toMatchObject({ code: 'not-found' });
    await expect(removePhoto(await buildShop(), id)).rejects.toMatchObject({ code: 'not-found' });
    await removePhoto(shop.scope, id);
    await expect(readPhoto(shop.scope, id)).rejects.toMatchObject({ code: 'not-found' });

    await sendPicture();
    await fetchNow();
    expect(await photosOnBoard(shop)).toHaveLength(1);
    await database()('runs').where({ trial_id: shop.trialId }).update({ state: 'skipped' });
    const admin = await shop.add(['admin']);
    const { revision } = await database()('people').where({ id: crew.ana }).first('revision');
    await erasePerson(
      shop.as(admin),
      { id: crew.ana, revision },
      { ...admin, reach: 'everybody', seesPhones: true },
    );
    expect(await database()('photos').where({ shop_id: crew.shop.shopId })).toEqual([]);
  });
});
