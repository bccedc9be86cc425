import { config } from '../server/env.ts';
import { askNextRuns } from './ask-next-runs.ts';
import { backup } from './backup.ts';
import { beat } from './beat.ts';
import { catchUp } from './catch-up-texts.ts';
import { checkLog } from './check-log.ts';
import { fetchPhotos } from './fetch-photos.ts';
import { mailGateway, textGateway } from './gateways.ts';
import type { Job } from './loop.ts';
import { makeVerdicts } from './make-verdicts.ts';
import { readInbox } from './read-inbox.ts';
import { remind } from './remind-of-runs.ts';
import { retention } from './retention.ts';
import { sendMails, sendTexts } from './send-messages.ts';
import { settleUnsure } from './settle-unsure.ts';

/** Every job there is. A job that must not run in two workers at once takes a lease by its name (see `lease.ts`). */
export const jobs: Job[] = [
  beat,
  readInbox,
  askNextRuns,
  remind,
  makeVerdicts,
  sendTexts(textGateway, () => config().texts.perSecond),
  sendMails(mailGateway),
  settleUnsure(textGateway),
  catchUp(textGateway),
  fetchPhotos(textGateway),
  retention,
  checkLog,
  backup,
];
