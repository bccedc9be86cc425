import { z } from 'zod';
import {
  addTokenSchema,
  listedTokenSchema,
  newTokenSchema,
} from '../../../../features/people/profile.schema.ts';
import { addOwnToken, listOwnTokens } from '../../../../features/people/token.service.ts';
import { defineEndpoint } from '../../../../server/http/define-endpoint.ts';

export const GET = defineEndpoint(
  { access: 'token.own', output: z.object({ tokens: z.array(listedTokenSchema) }) },
  async ({ scope, viewer }) => ({ tokens: await listOwnTokens(scope, viewer) }),
);

export const POST = defineEndpoint(
  { access: 'token.own', body: addTokenSchema, output: newTokenSchema, status: 201 },
  ({ scope, viewer, body }) => addOwnToken(scope, viewer, body.name),
);
