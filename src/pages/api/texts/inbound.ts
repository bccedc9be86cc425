import { takeInboundWebhook } from '../../../features/message/webhook.service.ts';
import { defineOpenEndpoint, nothing } from '../../../server/http/define-endpoint.ts';

/** The text service tells of a text that came in. The empty answer says that nothing is to be texted back. */
export const POST = defineOpenEndpoint(
  { access: 'signed', output: nothing, status: 200 },
  async ({ context }) => {
    await takeInboundWebhook(context.request);
    return undefined;
  },
);
