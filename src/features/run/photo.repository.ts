import { z } from 'zod';
import { now } from '../../server/clock.ts';
import { moment } from '../../server/db/columns.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { newId } from '../../server/ids.ts';
import type { EncodedPhoto } from './encode-photo.ts';

export const photoSources = ['text', 'phone page'] as const;
export type PhotoSource = (typeof photoSources)[number];

const photoRow = z.object({
  id: z.string(),
  run_id: z.string(),
  width: z.number(),
  height: z.number(),
  source: z.enum(photoSources),
  sent_by: z.string().nullable(),
  created_at: moment,
});
export type StoredPhoto = z.output<typeof photoRow>;

/** Everything but the picture itself. */
const shown = ['id', 'run_id', 'width', 'height', 'source', 'sent_by', 'created_at'];

/** @returns its id, or null when this run has the same picture already */
export async function insertPhoto(
  scope: ShopScope,
  photo: EncodedPhoto & { runId: string; source: PhotoSource; sentBy: string | null },
): Promise<string | null> {
  const id = newId();
  const added = await scope
    .db('photos')
    .insert({
      id,
      shop_id: scope.shopId,
      run_id: photo.runId,
      sha256: photo.sha256,
      width: photo.width,
      height: photo.height,
      bytes: photo.bytes,
      source: photo.source,
      sent_by: photo.sentBy,
      created_at: now(),
    })
    .onConflict(['shop_id', 'run_id', 'sha256'])
    .ignore()
    .returning('id');
  return added.length > 0 ? id : null;
}

/** The pictures of these runs, oldest first, without their bytes. */
export async function listPhotos(scope: ShopScope, runIds: readonly string[]): Promise<StoredPhoto[]> {
  const rows = await scope
    .db('photos')
    .where({ shop_id: scope.shopId })
    .whereIn('run_id', [...runIds])
    .orderBy('id')
    .select(shown);
  return z.array(photoRow).parse(rows);
}

export async function countPhotos(scope: ShopScope, runId: string): Promise<number> {
  const row = await scope
    .db('photos')
    .where({ shop_id: scope.shopId, run_id: runId })
    .count({ n: '*' })
    .first();
  return Number(row?.['n'] ?? 0);
}

export async function findPhoto(scope: ShopScope, id: string): Promise<StoredPhoto | null> {
  const row: unknown = await scope.db('photos').where({ shop_id: scope.shopId, id }).first(shown);
  return row ? photoRow.parse(row) : null;
}

export async function readPhotoBytes(scope: ShopScope, id: string): Promise<Uint8Array | null> {
  const row: unknown = await scope.db('photos').where({ shop_id: scope.shopId, id }).first('bytes');
  return row ? z.object({ bytes: z.instanceof(Uint8Array) }).parse(row).bytes : null;
}

export async function deletePhoto(scope: ShopScope, id: string): Promise<void> {
  await scope.db('photos').where({ shop_id: scope.shopId, id }).delete();
}
