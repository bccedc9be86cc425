import { createServer, type IncomingMessage } from 'node:http';
import type { AddressInfo } from 'node:net';
import { createMailGateway } from '../../../src/features/message/mail-gateway.ts';
import type { TextGateway } from '../../../src/features/message/text-gateway.ts';
import { createTwilioGateway } from '../../../src/features/message/twilio-gateway.ts';
import { takeInboundWebhook, takeStatusWebhook } from '../../../src/features/message/webhook.service.ts';
import { now } from '../../../src/server/clock.ts';
import { database } from '../../../src/server/db/connection.ts';
import { config } from '../../../src/server/env.ts';
import { AppError } from '../../../src/server/errors.ts';
import type { Job } from '../../../src/worker/loop.ts';
import { readInbox } from '../../../src/worker/read-inbox.ts';
import { sendMails, sendTexts } from '../../../src/worker/send-messages.ts';
import { type StandIns, startStandIns } from '../stand-ins.ts';

/** The product's text side and the stand-ins for its services, joined by HTTP as in earnest. */
export interface TextDesk extends StandIns {
  gateway: TextGateway;
  /** Runs the worker's jobs until none of them finds anything to do. */
  work(): Promise<void>;
  /** How each webhook was answered so far. */
  answers: { path: string; status: number }[];
  close(): Promise<void>;
}

async function readBody(request: IncomingMessage): Promise<string> {
  const chunks: Buffer[] = [];
  for await (const chunk of request) chunks.push(Buffer.from(chunk));
  return Buffer.concat(chunks).toString('utf8');
}

/** Answers as the two endpoints do: 200 or the refusal's status. */
export async function answerWebhook(request: Request): Promise<number> {
  const { pathname, searchParams } = new URL(request.url);
  try {
    if (pathname === '/api/texts/inbound') await takeInboundWebhook(request);
    else await takeStatusWebhook(request, searchParams.get('m'));
    return 200;
  } catch (error) {
    if (error instanceof AppError) return error.status;
    throw error;
  }
}

export async function openTextDesk(): Promise<TextDesk> {
  const { appUrl, texts, clockOffsetFile } = config();
  const { accountSid, authToken } = texts;
  const answers: TextDesk['answers'] = [];
  const server = createServer((incoming, outgoing) => {
    const answer = async () => {
      const headers = new Headers();
      for (const [name, value] of Object.entries(incoming.headers)) headers.set(name, String(value));
      const path = incoming.url ?? '/';
      // The address that a request claims for itself is not the public one, and must not matter.
      const url = `http://somewhere.invalid${path}`;
      const request = new Request(url, { method: 'POST', headers, body: await readBody(incoming) });
      const status = await answerWebhook(request);
      answers.push({ path, status });
      outgoing.writeHead(status).end();
    };
    answer().catch(() => outgoing.destroy());
  });
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  const webhookTarget = `http://127.0.0.1:${(server.address() as AddressInfo).port}`;
  const standIns = await startStandIns(appUrl, {
    webhookTarget,
    accountSid,
    authToken,
    clockOffsetFile: clockOffsetFile ?? undefined,
  });
  const apiUrl = standIns.textsUrl;
  const gateway = createTwilioGateway(
    { accountSid, authToken, apiUrl, publicUrl: appUrl, timeoutMilliseconds: 500 },
    now,
  );
  const mails = createMailGateway({
    host: '127.0.0.1',
    port: standIns.smtpPort,
    secure: false,
    requireTls: false,
    from: { name: 'Trywell', address: 'trywell@shop.example' },
  });
  const jobs = [
    readInbox,
    sendTexts(
      () => gateway,
      () => 1000,
    ),
    sendMails(() => mails),
  ];
  return {
    ...standIns,
    gateway,
    answers,
    work: () => runUntilIdle(jobs),
    close: async () => {
      await standIns.stop();
      mails.close();
      await new Promise<void>((resolve) => {
        server.close(() => resolve());
        server.closeAllConnections();
      });
    },
  };
}

const context = { workerId: 'worker under test', stopping: () => false };

export async function runUntilIdle(jobs: readonly Job[]): Promise<void> {
  let done = 1;
  while (done > 0) {
    done = 0;
    for (const job of jobs) done += await job.run({ db: database(), ...context });
  }
}
