import { activityPageSchema, listActivitySchema } from '../../features/shop/activity.schema.ts';
import { readActivity } from '../../features/shop/activity.service.ts';
import { defineEndpoint } from '../../server/http/define-endpoint.ts';

export const GET = defineEndpoint(
  { access: 'activity.read', query: listActivitySchema, output: activityPageSchema },
  ({ scope, query }) => readActivity(scope, query),
);
