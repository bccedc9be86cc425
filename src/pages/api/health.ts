import { z } from 'zod';
import { readHealth } from '../../server/health.ts';
import { defineOpenEndpoint } from '../../server/http/define-endpoint.ts';

/** For a watchdog: is the product well, yes or no; nothing more for strangers. */
export const GET = defineOpenEndpoint(
  { access: 'public', output: z.object({ ok: z.boolean() }) },
  async () => {
    const ok = await readHealth();
    return Response.json({ ok }, { status: ok ? 200 : 503, headers: { 'Cache-Control': 'no-store' } });
  },
);
