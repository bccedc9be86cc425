import { AppError } from '../../server/errors.ts';
import { defineOpenEndpoint, nothing } from '../../server/http/define-endpoint.ts';

/** Addresses under /api that no endpoint has answer as programs expect, not with a page. */
export const ALL = defineOpenEndpoint({ access: 'public', output: nothing }, async () => {
  throw new AppError('not-found');
});
