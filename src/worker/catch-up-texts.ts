import { catchUpTexts } from '../features/message/catching-up.service.ts';
import type { TextGateway } from '../features/message/text-gateway.ts';
import { wakeWorker } from '../server/wake.ts';
import type { Job } from './loop.ts';

/** At the start and every two minutes: texts that the service received while no webhook reached us. */
export function catchUp(gateway: () => TextGateway): Job {
  return {
    name: 'catch-up-texts',
    everyMilliseconds: 120_000,
    async run({ db }) {
      const added = await catchUpTexts(db, gateway());
      if (added > 0) wakeWorker();
      // Always to sleep: what was found is the inbox's work, and the list need not be asked again at once.
      return 0;
    },
  };
}
