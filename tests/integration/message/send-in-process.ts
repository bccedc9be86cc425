import { createTwilioGateway } from '../../../src/features/message/twilio-gateway.ts';
import { now } from '../../../src/server/clock.ts';
import { closeDatabase, database } from '../../../src/server/db/connection.ts';
import { config } from '../../../src/server/env.ts';
import { sendTexts } from '../../../src/worker/send-messages.ts';

// A worker in a process of its own that only sends. It prints how many rounds found something to do, and ends when a
// second has passed without work.
const { accountSid, authToken, apiUrl, perSecond } = config().texts;
const gateway = createTwilioGateway(
  { accountSid, authToken, apiUrl: apiUrl ?? undefined, publicUrl: config().appUrl },
  now,
);
const job = sendTexts(
  () => gateway,
  () => perSecond,
);
const context = { db: database(), workerId: `process ${process.pid}`, stopping: () => false };
const patience = 1000;

process.stdout.write('READY\n');
let idleSince = Date.now();
let rounds = 0;
while (Date.now() - idleSince < patience) {
  const done = await job.run(context);
  rounds += done;
  if (done > 0) idleSince = Date.now();
  else await new Promise((resolve) => setTimeout(resolve, 20));
}
await closeDatabase();
process.stdout.write(`DONE ${rounds}\n`);
