import { AppError } from '../errors.ts';

/** A form as it was sent, with what is needed to check its signature. */
export interface SignedForm {
  /** The configured public address with the path and query that were asked for: what the sender signed. */
  url: string;
  signature: string | null;
  parameters: Record<string, string>;
}

/**
 * Reads a form that its sender has signed.
 * @param appUrl the configured public address; the request's own idea of its host is never asked
 * @throws AppError `wrong-content-type`
 */
export async function readSignedForm(request: Request, appUrl: string): Promise<SignedForm> {
  const contentType = request.headers.get('content-type') ?? '';
  if (!/^application\/x-www-form-urlencoded\b/i.test(contentType)) throw new AppError('wrong-content-type');
  const { pathname, search } = new URL(request.url);
  return {
    url: `${appUrl}${pathname}${search}`,
    signature: request.headers.get('x-twilio-signature'),
    parameters: Object.fromEntries(new URLSearchParams(await request.text())),
  };
}
