import { fetchMedia } from '../features/message/fetch-media.ts';
import type { TextGateway } from '../features/message/text-gateway.ts';
import { hostedUrl } from '../features/message/twilio-gateway.ts';
import { fetchPhotos as fetchDuePhotos } from '../features/run/fetch-photos.service.ts';
import { config } from '../server/env.ts';
import { bodyLimits } from '../server/limits.ts';
import { holdLease } from './lease.ts';
import type { Job } from './loop.ts';

/** Hosts that the text service hands its pictures on to. */
const stores = ['.twiliocdn.com', '.twilio.com', 's3-external-1.amazonaws.com'];
const timeoutMilliseconds = 20_000;

/** Fetches pictures that came by text; one worker at a time, as each is drawn anew. */
export function fetchPhotos(gateway: () => TextGateway): Job {
  return {
    name: 'fetch-photos',
    everyMilliseconds: 2_000,
    async run(context) {
      if (!(await holdLease(context, 'fetch-photos', 10 * timeoutMilliseconds))) return 0;
      const { mode, texts } = config();
      const settings = {
        serviceUrl: texts.apiUrl ?? hostedUrl,
        accountSid: texts.accountSid,
        authToken: texts.authToken,
        allowedHosts: stores,
        isLive: mode === 'live',
        limitBytes: bodyLimits.photo,
        timeoutMilliseconds,
      };
      return fetchDuePhotos(context.db, {
        gateway: gateway(),
        fetch: (address) => fetchMedia(address, settings),
      });
    },
  };
}
