import { recordActivity } from '../../server/db/activity-log.ts';
import { inTransaction } from '../../server/db/in-transaction.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { AppError } from '../../server/errors.ts';
import { photoPixelLimit } from '../../server/limits.ts';
import { encodePhoto } from './encode-photo.ts';
import {
  countPhotos,
  deletePhoto,
  findPhoto,
  insertPhoto,
  type PhotoSource,
  readPhotoBytes,
} from './photo.repository.ts';
import { touchBoard } from './run.repository.ts';
import { findRunOf } from './run-reader.service.ts';

/** Enough to show what went wrong with one run; keeps a stuck phone from filling the database. */
const mostPhotosARun = 12;

export type PhotoAnswer = 'kept' | 'already' | 'not a picture' | 'enough';

/**
 * Keeps a picture with its run, drawn anew. The drawing is done before the transaction: it takes its time.
 * @throws AppError `not-found`
 */
export async function addPhoto(
  scope: ShopScope,
  photo: { runId: string; bytes: Uint8Array; source: PhotoSource; sentBy: string | null },
): Promise<PhotoAnswer> {
  const { bytes, ...about } = photo;
  const encoded = await encodePhoto(bytes, photoPixelLimit);
  if (encoded === null) return 'not a picture';
  return inTransaction(scope, async (inner): Promise<PhotoAnswer> => {
    const run = await findRunOf(inner, photo.runId);
    if ((await countPhotos(inner, run.id)) >= mostPhotosARun) return 'enough';
    const id = await insertPhoto(inner, { ...encoded, ...about });
    if (id === null) return 'already';
    await touchBoard(inner, run.trialId);
    const details = { run: run.number, source: photo.source };
    await recordActivity(inner, { kind: 'photo.added', subjectId: id, trialId: run.trialId, details });
    return 'kept';
  });
}

/** @throws AppError `not-found`, for another shop's picture too */
export async function readPhoto(scope: ShopScope, id: string): Promise<Uint8Array> {
  const bytes = await readPhotoBytes(scope, id);
  if (bytes === null) throw new AppError('not-found', { detail: 'no such picture' });
  return bytes;
}

/** Takes a picture away for good. @throws AppError `not-found` */
export function removePhoto(scope: ShopScope, id: string): Promise<void> {
  return inTransaction(scope, async (inner) => {
    const photo = await findPhoto(inner, id);
    if (photo === null) throw new AppError('not-found', { detail: 'no such picture' });
    const run = await findRunOf(inner, photo.run_id);
    await deletePhoto(inner, id);
    await touchBoard(inner, run.trialId);
    const details = { run: run.number };
    await recordActivity(inner, { kind: 'photo.removed', subjectId: id, trialId: run.trialId, details });
  });
}
