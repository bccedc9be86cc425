import { runStorySchema } from '../../../../features/run/board.schema.ts';
import { readRunStory } from '../../../../features/run/read-run-story.service.ts';
import { runParamsSchema } from '../../../../features/run/run-event.schema.ts';
import { defineEndpoint } from '../../../../server/http/define-endpoint.ts';

export const GET = defineEndpoint(
  { access: 'trial.read', params: runParamsSchema, output: runStorySchema },
  ({ scope, params }) => readRunStory(scope, params.id),
);
