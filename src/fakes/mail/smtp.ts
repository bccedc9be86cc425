import type { AddressInfo } from 'node:net';
import type { Readable } from 'node:stream';
import { SMTPServer } from 'smtp-server';
import type { SharedClock } from '../clock.ts';
import { type Faults, takeOne } from '../text-service/faults.ts';
import type { Mailbox } from './mailbox.ts';

const longestMail = 5 * 1024 * 1024;

/** A mail server on loopback that keeps whatever it is given and sends nothing on. */
export interface MailServer {
  port: number;
  stop(): Promise<void>;
}

export async function startMailServer(options: {
  port: number;
  mailbox: Mailbox;
  clock: SharedClock;
  faults: () => Faults;
}): Promise<MailServer> {
  const { port, mailbox, clock, faults } = options;
  const server = new SMTPServer({
    authOptional: true,
    disabledCommands: ['STARTTLS'],
    allowInsecureAuth: true,
    onAuth: (auth, _session, done) => done(null, { user: auth.username ?? 'anyone' }),
    size: longestMail,
    logger: false,
    onData: (stream, session, done) => {
      readWhole(stream)
        .then(async (raw) => {
          const { refuseNextMails } = faults();
          if (takeOne(refuseNextMails)) {
            done(
              Object.assign(new Error('This fault was asked for'), { responseCode: refuseNextMails.code }),
            );
            return;
          }
          await mailbox.add(
            raw,
            session.envelope.rcptTo.map(({ address }) => address),
            clock.now(),
          );
          done();
        })
        .catch((error: Error) => done(error));
    },
  });
  // A client that hangs up in the middle is its own affair.
  server.on('error', () => {});
  await new Promise<void>((resolve, reject) => {
    server.server.once('error', reject);
    server.listen(port, '127.0.0.1', () => resolve());
  });
  return {
    port: (server.server.address() as AddressInfo).port,
    stop: () => new Promise((resolve) => server.close(() => resolve())),
  };
}

async function readWhole(stream: Readable): Promise<Buffer> {
  const chunks: Buffer[] = [];
  for await (const chunk of stream) chunks.push(Buffer.from(chunk));
  return Buffer.concat(chunks);
}
