// npm run bench:load : 500 phones of 50 shops reply 100 times a second for a minute, by signed webhooks. Ends with 1 when a
// reply was refused or lost, or the webhook's 99th percentile is 100 ms or more. Loopback only; ends by itself.

import { randomBytes } from 'node:crypto';
import { Agent, request } from 'node:http';
import { setTimeout as wait } from 'node:timers/promises';
import type { Knex } from 'knex';
import { signWebhook } from '../../../src/fakes/text-service/webhooks.ts';
import { testAccount } from '../../integration/stand-ins.ts';
import { markdownTable } from '../verdict/simulation.ts';
import { buildCrowd, type CrowdMember } from './crowd.ts';
import { describeMachine, report } from './report.ts';
import { openTwoPrograms } from './two-programs.ts';

const shops = 50;
const each = 10;
const perSecond = 100;
const seconds = 60;
const limitMilliseconds = 100;
const drainMilliseconds = 180_000;

const agent = new Agent({ keepAlive: true, maxSockets: 64 });

/** One reply as the service tells it. @returns how it was answered, and after how long */
function reply(url: string, member: CrowdMember, body: string): Promise<{ status: number; took: number }> {
  const parameters = {
    ...{ AccountSid: testAccount.accountSid, MessageSid: `SM${randomBytes(16).toString('hex')}` },
    ...{ From: member.phone, To: member.number, Body: body, NumMedia: '0', SmsStatus: 'received' },
  };
  const address = `${url}/api/texts/inbound`;
  const content = new URLSearchParams(parameters).toString();
  const began = performance.now();
  return new Promise((resolve) => {
    const outgoing = request(address, {
      agent,
      method: 'POST',
      headers: {
        'content-type': 'application/x-www-form-urlencoded; charset=UTF-8',
        'content-length': Buffer.byteLength(content),
        'x-twilio-signature': signWebhook(testAccount.authToken, address, parameters),
      },
    });
    const done = (status: number) => resolve({ status, took: performance.now() - began });
    outgoing.on('response', (response) => {
      response.resume();
      response.on('end', () => done(response.statusCode ?? 0));
    });
    outgoing.on('error', () => done(0));
    outgoing.end(content);
  });
}

/** Sends on the beat, however long the answers take: a service does not wait for us either. */
async function replyForAMinute(url: string, crowd: readonly CrowdMember[]) {
  const began = performance.now();
  const answers: Promise<{ status: number; took: number }>[] = [];
  for (let n = 0; n < perSecond * seconds; n += 1) {
    const due = began + (n * 1000) / perSecond;
    if (due > performance.now()) await wait(due - performance.now());
    const member = crowd[n % crowd.length];
    if (member) answers.push(reply(url, member, String(33 + (n % 500) / 100)));
  }
  const sendingSeconds = (performance.now() - began) / 1000;
  return { answers: await Promise.all(answers), sendingSeconds };
}

async function countTexts(db: Knex, where: Record<string, unknown> = {}): Promise<number> {
  const row = await db('inbox_texts').where(where).count({ n: '*' }).first();
  return Number(row?.['n']);
}

/** How long the worker needs for what has piled up; null where it is not through in time. */
async function drain(db: Knex): Promise<number | null> {
  const began = Date.now();
  while ((await countTexts(db, { state: 'new' })) > 0) {
    if (Date.now() - began > drainMilliseconds) return null;
    await wait(500);
  }
  return Math.round((Date.now() - began) / 1000);
}

const percentile = (sorted: readonly number[], share: number): string =>
  `${(sorted[Math.min(sorted.length - 1, Math.floor(sorted.length * share))] ?? 0).toFixed(1)} ms`;

const machine = describeMachine();
const product = await openTwoPrograms((db) => buildCrowd(db, { shops, each }));
try {
  const crowd = product.prepared;
  const { answers, sendingSeconds } = await replyForAMinute(product.url, crowd);
  const left = await countTexts(product.db, { state: 'new' });
  const drained = await drain(product.db);
  const kept = await countTexts(product.db);
  const refused = answers.filter(({ status }) => status !== 200).length;
  const times = answers.map(({ took }) => took).sort((one, other) => one - other);
  const p99 = times[Math.floor(times.length * 0.99)] ?? 0;

  report('texts-load', 'Replies of 500 phones of 50 shops for a minute', [
    `Signed webhooks on the beat, ${perSecond} a second, to the built product as two programs, web and worker, on one database file. Every phone has a running trial. The program that sends runs on the same machine.`,
    markdownTable(
      ['what', 'figure'],
      [
        ['replies sent', answers.length],
        ['seconds they took to send', sendingSeconds.toFixed(1)],
        ['answered other than 200', refused],
        ['kept, each once', kept],
        ['webhook, median', percentile(times, 0.5)],
        ['webhook, 95th percentile', percentile(times, 0.95)],
        ['webhook, 99th percentile (limit 100 ms)', percentile(times, 0.99)],
        ['webhook, slowest', percentile(times, 1)],
        ['replies still unread after the minute', left],
        ['seconds until the worker had read them', drained ?? `more than ${drainMilliseconds / 1000}`],
      ],
    ),
    machine,
  ]);
  const isKept = refused === 0 && kept === answers.length;
  console.log(`p99 ${p99.toFixed(1)} ms, refused ${refused}, kept ${kept} of ${answers.length}`);
  process.exitCode = isKept && p99 < limitMilliseconds ? 0 : 1;
} finally {
  agent.destroy();
  await product.close();
}
