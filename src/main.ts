import { once } from 'node:events';
import type { Server } from 'node:http';
import { fileURLToPath } from 'node:url';
import { offerFirstSetUp } from './features/shop/installation.service.ts';
import { lockDataFolder, StartRefusal } from './server/data-folder.ts';
import { closeDatabase, database } from './server/db/connection.ts';
import { migrateToLatest, seedDemo } from './server/db/migrate.ts';
import { demoSignIns } from './server/demo-sign-ins.ts';
import { type Config, ConfigurationError, config } from './server/env.ts';
import { createWebServer, type PageHandler } from './server/http/node-server.ts';
import { describeError, log } from './server/log.ts';
import { jobs } from './worker/jobs.ts';
import { startWorker } from './worker/loop.ts';

async function listen(settings: Config): Promise<Server> {
  // The pages are a bundle of their own, made by `astro build` beside this file.
  const entry = new URL('../server/entry.mjs', import.meta.url).href;
  const { handler } = (await import(/* @vite-ignore */ entry)) as { handler: PageHandler };
  const server = createWebServer(handler, fileURLToPath(new URL('../client', import.meta.url)));
  server.listen(settings.port, settings.host);
  try {
    await once(server, 'listening');
  } catch (error) {
    const taken = (error as NodeJS.ErrnoException).code === 'EADDRINUSE';
    if (!taken) throw error;
    throw new StartRefusal(`Port ${settings.port} is taken by another program. Choose another with PORT.`);
  }
  server.on('error', (error) => log.error({ event: 'server-error', error: describeError(error) }));
  return server;
}

async function start(settings: Config): Promise<() => Promise<void>> {
  const unlock = lockDataFolder(settings);
  try {
    if (settings.role !== 'web') {
      await migrateToLatest(database(), settings);
      await seedDemo(database());
    }
    const server = settings.role === 'worker' ? null : await listen(settings);
    const worker = settings.role === 'web' ? null : startWorker(jobs, database());
    return async () => {
      const closed = server ? once(server, 'close') : null;
      server?.close();
      server?.closeIdleConnections();
      await Promise.all([closed, worker?.stop()]);
      await closeDatabase();
      unlock();
    };
  } catch (error) {
    await closeDatabase();
    unlock();
    throw error;
  }
}

function refusalSentence(error: unknown): string | null {
  if (error instanceof StartRefusal || error instanceof ConfigurationError) return error.message;
  return null;
}

/** What whoever started us may tell the person at the terminal: how to get in. */
async function describeStart(settings: Config) {
  const url = settings.appUrl;
  if (settings.mode === 'demo') return { url, signIns: demoSignIns };
  const setUpUrl = settings.role === 'web' ? null : await offerFirstSetUp(database());
  return setUpUrl === null ? { url } : { url, setUpUrl };
}

async function run(): Promise<void> {
  const settings = config();
  const stop = await start(settings);
  log.info({ event: 'started' });
  process.stdout.write(`READY ${JSON.stringify(await describeStart(settings))}\n`);

  let stopping = false;
  const end = async () => {
    if (stopping) return;
    stopping = true;
    await stop();
    log.info({ event: 'stopped' });
    process.exit(0);
  };
  process.on('SIGTERM', end);
  process.on('SIGINT', end);
}

run().catch((error: unknown) => {
  const sentence = refusalSentence(error);
  if (sentence === null) log.error({ event: 'start-failed', error: describeError(error) });
  process.stderr.write(`REFUSED ${sentence ?? 'Trywell could not start. The lines above say why.'}\n`);
  process.exit(1);
});
