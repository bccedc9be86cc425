import { z } from 'zod';
import { textsCheckSchema } from '../../../features/shop/texts-check.schema.ts';
import { readTextsCheck, startTextsCheck } from '../../../features/shop/texts-check.service.ts';
import { countTry } from '../../../server/auth/rate-limits.ts';
import { defineEndpoint } from '../../../server/http/define-endpoint.ts';
import { wakeWorker } from '../../../server/wake.ts';

export const GET = defineEndpoint({ access: 'shop.manage', output: textsCheckSchema }, ({ scope }) =>
  readTextsCheck(scope),
);

export const POST = defineEndpoint(
  { access: 'shop.manage', body: z.strictObject({}), output: textsCheckSchema },
  async ({ scope, viewer }) => {
    await countTry('invite', 'texts-check', viewer.personId);
    const check = await startTextsCheck(scope);
    wakeWorker();
    return check;
  },
);
