import { z } from 'zod';
import { endOwnToken } from '../../../../features/people/token.service.ts';
import { defineEndpoint, nothing } from '../../../../server/http/define-endpoint.ts';

export const DELETE = defineEndpoint(
  { access: 'token.own', params: z.object({ id: z.string() }), output: nothing },
  async ({ scope, viewer, params }) => endOwnToken(scope, viewer, params.id),
);
