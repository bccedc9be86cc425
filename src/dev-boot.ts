import { database } from './server/db/connection.ts';
import { migrateToLatest, seedDemo } from './server/db/migrate.ts';
import { config } from './server/env.ts';
import { jobs } from './worker/jobs.ts';
import { startWorker } from './worker/loop.ts';

// What `main.ts` does before the pages, for the daily server, which runs the pages itself (see astro.config.mjs).
await migrateToLatest(database(), config());
await seedDemo(database());
startWorker(jobs, database());
