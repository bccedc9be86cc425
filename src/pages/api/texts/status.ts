import { takeStatusWebhook } from '../../../features/message/webhook.service.ts';
import { defineOpenEndpoint, nothing } from '../../../server/http/define-endpoint.ts';

/** The text service tells what became of a text that went out; `m` in the address is the message's id. */
export const POST = defineOpenEndpoint(
  { access: 'signed', output: nothing, status: 200 },
  async ({ context }) => {
    await takeStatusWebhook(context.request, context.url.searchParams.get('m'));
    return undefined;
  },
);
