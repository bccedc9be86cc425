import { textsPreviewSchema } from '../../../../features/trial/texts-preview.schema.ts';
import { previewTexts } from '../../../../features/trial/texts-preview.service.ts';
import { trialParamsSchema } from '../../../../features/trial/trial.schema.ts';
import { defineEndpoint } from '../../../../server/http/define-endpoint.ts';

/** Run 1 as each language of the crew would get it, with its length. */
export const GET = defineEndpoint(
  { access: 'trial.read', params: trialParamsSchema, output: textsPreviewSchema },
  ({ scope, viewer, params }) => previewTexts(scope, params.id, viewer),
);
