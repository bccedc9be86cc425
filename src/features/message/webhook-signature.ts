import twilio from 'twilio';

/**
 * Tells whether a webhook really comes from the text service.
 * @param call.url the configured public address with the path and query that were asked for, never the request's host
 * @param call.signature the X-Twilio-Signature header, null where there is none
 * @param call.parameters the form's fields
 */
export function isSignedWebhook(call: {
  authToken: string;
  url: string;
  signature: string | null;
  parameters: Readonly<Record<string, string>>;
}): boolean {
  const { authToken, url, signature, parameters } = call;
  return signature !== null && twilio.validateRequest(authToken, signature, url, { ...parameters });
}
