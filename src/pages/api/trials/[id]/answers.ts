import { readAnswers, saveAnswer } from '../../../../features/trial/answers.service.ts';
import {
  answerSavedSchema,
  publicAnswersSchema,
  saveAnswerSchema,
} from '../../../../features/trial/saved-answers.schema.ts';
import { trialParamsSchema } from '../../../../features/trial/trial.schema.ts';
import { defineEndpoint } from '../../../../server/http/define-endpoint.ts';

export const GET = defineEndpoint(
  { access: 'trial.read', params: trialParamsSchema, output: publicAnswersSchema },
  ({ scope, viewer, params }) => readAnswers(scope, params.id, viewer),
);

export const PATCH = defineEndpoint(
  {
    access: 'trial.write',
    params: trialParamsSchema,
    body: saveAnswerSchema,
    output: answerSavedSchema,
  },
  ({ scope, viewer, params, body }) => saveAnswer(scope, { ...body, trialId: params.id }, viewer),
);
