import { boardSchema } from '../../../../features/run/board.schema.ts';
import { readBoard, readBoardStamp } from '../../../../features/run/read-board.service.ts';
import { trialParamsSchema } from '../../../../features/trial/trial.schema.ts';
import { defineEndpoint } from '../../../../server/http/define-endpoint.ts';

/** Asked every few seconds by each open board: whoever has the present state already gets an empty answer. */
export const GET = defineEndpoint(
  { access: 'trial.read', byToken: true, params: trialParamsSchema, output: boardSchema },
  async ({ scope, viewer, params, context }) => {
    const seen = context.request.headers.get('if-none-match');
    const headers = { 'Cache-Control': 'private, no-cache' };
    if (seen !== null) {
      const etag = `"${await readBoardStamp(scope, params.id)}"`;
      // What a reader may do belongs to the answer, and changes with their roles: those are asked for on a page load.
      if (seen === etag) return new Response(null, { status: 304, headers: { ...headers, ETag: etag } });
    }
    const board = await readBoard(scope, params.id, viewer);
    return Response.json(boardSchema.parse(board), { headers: { ...headers, ETag: `"${board.stamp}"` } });
  },
);
