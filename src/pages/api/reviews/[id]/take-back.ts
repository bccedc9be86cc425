import {
  decideReviewSchema,
  publicReviewSchema,
  reviewParamsSchema,
} from '../../../../features/trial/review.schema.ts';
import { decideReview } from '../../../../features/trial/review.service.ts';
import { defineEndpoint } from '../../../../server/http/define-endpoint.ts';

/** Who may do it is in the table of states: a safety person is no role. */
export const POST = defineEndpoint(
  {
    access: 'trial.read',
    params: reviewParamsSchema,
    body: decideReviewSchema,
    output: publicReviewSchema,
  },
  ({ scope, viewer, params, body }) =>
    decideReview(scope, { ...params, ...body, decision: 'take-back' }, viewer),
);
