import { mkdirSync } from 'node:fs';
import { join } from 'node:path';
import { openSharedClock } from './clock.ts';
import { controlRoutes } from './control-routes.ts';
import { startLoopbackServer } from './http/server.ts';
import { mailRoutes } from './mail/mail-routes.ts';
import { openMailbox } from './mail/mailbox.ts';
import { startMailServer } from './mail/smtp.ts';
import type { FakesSettings } from './settings.ts';
import { textApiRoutes } from './text-service/api-routes.ts';
import { noFaults } from './text-service/faults.ts';
import { mediaRoutes } from './text-service/media-routes.ts';
import { phoneRoutes } from './text-service/phone-routes.ts';
import { openTextService } from './text-service/text-service.ts';

export interface Fakes {
  /** Base address of the text service's API and of the phones' page. */
  textsUrl: string;
  mailUrl: string;
  smtpPort: number;
  stop(): Promise<void>;
}

/**
 * Starts the local stand-ins for the hosted services: texts and mail, with their pages.
 * @throws when a port is taken or a kept file cannot be read
 */
export async function startFakes(settings: FakesSettings): Promise<Fakes> {
  const { dataFolder } = settings;
  if (dataFolder !== undefined) mkdirSync(dataFolder, { recursive: true });
  const keptFile = (name: string) => (dataFolder === undefined ? undefined : join(dataFolder, name));

  const clock = openSharedClock(settings.clockOffsetFile);
  const faults = noFaults();
  const currentFaults = () => faults;
  const mailbox = openMailbox(keptFile('mails.json'));
  let apiUrl = '';
  const service = openTextService({
    settings,
    clock,
    faults: currentFaults,
    file: keptFile('texts.json'),
    apiUrl: () => apiUrl,
  });
  const routes = [
    ...mediaRoutes(settings, service),
    ...textApiRoutes({ settings, service, faults: currentFaults, clock }),
    ...phoneRoutes({ settings, service, clock, faults: currentFaults }),
    ...mailRoutes(mailbox, clock),
    ...controlRoutes({ service, mailbox, clock, faults }),
  ];
  const web = await startLoopbackServer(routes, settings.httpPort);
  apiUrl = web.url;
  const smtp = await startMailServer({ port: settings.smtpPort, mailbox, clock, faults: currentFaults });
  return {
    textsUrl: web.url,
    mailUrl: `${web.url}/mail`,
    smtpPort: smtp.port,
    stop: async () => {
      service.stop();
      await Promise.all([web.stop(), smtp.stop()]);
      mailbox.close();
    },
  };
}
