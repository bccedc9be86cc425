import { backUpDaily } from '../server/db/backups.ts';
import { config } from '../server/env.ts';
import { daily } from './daily.ts';

/** Once a day: a checked copy of the whole database. */
export const backup = daily('backup', async ({ db }, day) => {
  await backUpDaily(db, config(), day);
});
