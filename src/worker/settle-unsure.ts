import { settleUnsureTexts } from '../features/message/settling.service.ts';
import type { TextGateway } from '../features/message/text-gateway.ts';
import type { Job } from './loop.ts';

/** Asks the service's list about texts whose fate is unknown. Soon after, because a run may hang on one of them. */
export function settleUnsure(gateway: () => TextGateway): Job {
  return {
    name: 'settle-unsure',
    everyMilliseconds: 5_000,
    run: ({ db }) => settleUnsureTexts(db, gateway()),
  };
}
