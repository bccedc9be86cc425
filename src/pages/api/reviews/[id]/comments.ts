import {
  addCommentSchema,
  publicReviewSchema,
  reviewParamsSchema,
  settleCommentSchema,
} from '../../../../features/trial/review.schema.ts';
import { addComment, settleComment } from '../../../../features/trial/review-comments.service.ts';
import { defineEndpoint } from '../../../../server/http/define-endpoint.ts';

export const POST = defineEndpoint(
  {
    access: 'trial.read',
    params: reviewParamsSchema,
    body: addCommentSchema,
    output: publicReviewSchema,
  },
  ({ scope, viewer, params, body }) => addComment(scope, { ...body, reviewId: params.id }, viewer),
);

/** Settles a remark, or opens it again. */
export const PATCH = defineEndpoint(
  {
    access: 'trial.read',
    params: reviewParamsSchema,
    body: settleCommentSchema,
    output: publicReviewSchema,
  },
  ({ scope, viewer, params, body }) => settleComment(scope, { ...body, reviewId: params.id }, viewer),
);
