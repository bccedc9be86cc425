import type { Knex } from 'knex';
import { now } from '../../server/clock.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { log } from '../../server/log.ts';
import type { MediaAnswer } from '../message/fetch-media.ts';
import { type InboxText, listTextsWithPhotos, notePhotos } from '../message/inbox.repository.ts';
import { nextPause } from '../message/retry-plan.ts';
import { workerScope } from '../message/sending.service.ts';
import type { TextGateway } from '../message/text-gateway.ts';
import { addPhoto } from './photo.service.ts';

const textsAtOnce = 5;
const mostPictures = 10;

/** How pictures are asked for; the worker knows the service and its key. */
export interface PhotoSource {
  gateway: Pick<TextGateway, 'listMedia'>;
  fetch(address: string): Promise<MediaAnswer>;
}

/** Fetches the pictures of texts that were read, and keeps them with their runs. @returns how many texts */
export async function fetchPhotos(db: Knex, source: PhotoSource): Promise<number> {
  const texts = await listTextsWithPhotos(db, now(), textsAtOnce);
  for (const text of texts) await fetchPhotosOf(workerScope(db, text.shopId), text, source);
  return texts.length;
}

async function fetchPhotosOf(scope: ShopScope, text: InboxText, source: PhotoSource): Promise<void> {
  // A picture from a stranger, or about no run, is nobody's: it is not even asked for.
  if (text.personId === null || text.runId === null) return notePhotos(scope, text.id, { state: 'failed' });
  const addresses = await listAddresses(text, source);
  if (addresses === null) return tryLater(scope, text);
  let refused = 0;
  for (const address of addresses.slice(0, mostPictures)) {
    const answer = await source.fetch(address);
    if (answer.outcome === 'retryLater') return tryLater(scope, text);
    if (answer.outcome === 'refused') {
      log.warn({ event: 'picture-refused', shopId: scope.shopId, code: answer.why });
      refused += 1;
      continue;
    }
    const { bytes } = answer;
    const photo = { runId: text.runId, bytes, source: 'text', sentBy: text.personId } as const;
    if ((await addPhoto(scope, photo)) === 'not a picture') refused += 1;
  }
  return notePhotos(scope, text.id, { state: refused > 0 ? 'failed' : 'kept' });
}

async function listAddresses(text: InboxText, { gateway }: PhotoSource): Promise<string[] | null> {
  const { items, unlisted } = text.media;
  if (unlisted === 0) return items.map(({ url }) => url);
  const listing = await gateway.listMedia(text.providerId);
  return listing.outcome === 'listed' ? listing.addresses : null;
}

/** What was kept already is kept once; the rest is asked for again. */
async function tryLater(scope: ShopScope, text: InboxText): Promise<void> {
  const pause = nextPause({ attempts: text.photoAttempts + 1, random: Math.random() });
  await notePhotos(
    scope,
    text.id,
    pause === null ? { state: 'failed' } : { state: 'waiting', notBefore: now() + pause },
  );
}
