import { shareParamsSchema } from '../../../../../features/verdict/share.schema.ts';
import { endShare } from '../../../../../features/verdict/share.service.ts';
import { defineEndpoint, nothing } from '../../../../../server/http/define-endpoint.ts';

export const DELETE = defineEndpoint(
  { access: 'share.manage', params: shareParamsSchema, output: nothing },
  ({ scope, params }) => endShare(scope, { trialId: params.id, id: params.handle }).then(() => undefined),
);
