import { knexSettings } from './src/server/db/connection.ts';
import { config } from './src/server/env.ts';

export default {
  ...knexSettings(config().database),
  migrations: { directory: './migrations', extension: 'ts', loadExtensions: ['.ts'] },
  seeds: { directory: './seeds', extension: 'ts', loadExtensions: ['.ts'] },
};
