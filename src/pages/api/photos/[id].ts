import { z } from 'zod';
import { readPhoto, removePhoto } from '../../../features/run/photo.service.ts';
import { defineEndpoint, nothing } from '../../../server/http/define-endpoint.ts';

const params = z.object({ id: z.string() });

/** A picture never changes under its id; only whoever is signed in may keep it. */
export const GET = defineEndpoint(
  { access: 'trial.read', params, output: z.unknown() },
  async ({ scope, params: { id } }) =>
    new Response(new Uint8Array(await readPhoto(scope, id)), {
      headers: {
        'Content-Type': 'image/jpeg',
        'Content-Disposition': 'inline; filename="picture.jpg"',
        'Cache-Control': 'private, max-age=86400',
      },
    }),
);

export const DELETE = defineEndpoint(
  { access: 'run.record', params, output: nothing },
  ({ scope, params: { id } }) => removePhoto(scope, id),
);
