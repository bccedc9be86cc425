import type { APIRoute } from 'astro';
import { addPhonePhoto } from '../../../../features/phone/phone-photo.service.ts';
import { AppError } from '../../../../server/errors.ts';
import { networkOfRequest } from '../../../../server/http/network.ts';

/** A picture from a phone page: a plain form, answered by the page with what became of it. */
export const POST: APIRoute = async (context) => {
  const token = context.params['token'] ?? '';
  const form = await context.request.formData().catch((cause: unknown) => {
    throw new AppError('malformed', { cause });
  });
  const visit = { token, network: networkOfRequest(context) };
  const outcome = await addPhonePhoto(visit, context.params['id'] ?? '', form.get('photo')).catch(
    (thrown: unknown) => {
      // The page itself says that the link has ended.
      if (thrown instanceof AppError && thrown.code === 'gone') return null;
      throw thrown;
    },
  );
  const page = `/t/${encodeURIComponent(token)}`;
  return context.redirect(outcome === null ? page : `${page}?done=${outcome}`, 303);
};

/** Whoever loads this address again gets to the page. */
export const GET: APIRoute = (context) =>
  context.redirect(`/t/${encodeURIComponent(context.params['token'] ?? '')}`, 303);
