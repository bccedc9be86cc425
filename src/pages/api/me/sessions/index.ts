import { z } from 'zod';
import { ownSessionSchema } from '../../../../features/people/profile.schema.ts';
import { endOwnSessions, listOwnSessions } from '../../../../features/people/session.service.ts';
import { defineEndpoint, nothing } from '../../../../server/http/define-endpoint.ts';

export const GET = defineEndpoint(
  { access: 'signed-in', output: z.object({ sessions: z.array(ownSessionSchema) }) },
  async ({ scope, viewer }) => ({ sessions: await listOwnSessions(scope, viewer) }),
);

/** Signs out everywhere, here too. */
export const DELETE = defineEndpoint({ access: 'signed-in', output: nothing }, async ({ scope, viewer }) =>
  endOwnSessions(scope, viewer),
);
