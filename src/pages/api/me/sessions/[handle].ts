import { z } from 'zod';
import { endOwnSession } from '../../../../features/people/session.service.ts';
import { defineEndpoint, nothing } from '../../../../server/http/define-endpoint.ts';

export const DELETE = defineEndpoint(
  { access: 'signed-in', params: z.object({ handle: z.string() }), output: nothing },
  async ({ scope, viewer, params }) => endOwnSession(scope, viewer, params.handle),
);
