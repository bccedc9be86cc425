// @ts-check
import { resolve } from 'node:path';
import { projectFolder } from '../begin/project.mjs';
import { demoNumber, demoPhones } from './demo-phones.mjs';

/**
 * What the commands need to know before the product, which checks its own configuration, has started.
 * @typedef {{ isDemo: boolean, dataFolder: string, databaseFile: string, host: string, port: string, localUrl: string }} StartSettings
 */

/**
 * @param {NodeJS.ProcessEnv} env
 * @returns {StartSettings}
 */
export function readStartSettings(env) {
  const dataFolder = resolve(projectFolder, env['DATA_DIR'] || 'data');
  const host = env['HOST'] || '127.0.0.1';
  const port = env['PORT'] || '4310';
  return {
    isDemo: (env['APP_MODE'] || 'demo') === 'demo',
    dataFolder,
    databaseFile: resolve(dataFolder, 'trywell.sqlite'),
    host,
    port,
    localUrl: `http://${host.includes(':') ? `[${host}]` : host}:${port}`,
  };
}

/**
 * The environment of the demo's programs: one clock for both, and each knows where the other is.
 * @param {StartSettings} settings
 * @param {NodeJS.ProcessEnv} env
 * @returns {NodeJS.ProcessEnv}
 */
export function demoEnvironment({ dataFolder, localUrl }, env) {
  return {
    ...env,
    APP_MODE: 'demo',
    APP_URL: env['APP_URL'] || localUrl,
    DATA_DIR: dataFolder,
    CLOCK_OFFSET_FILE: env['CLOCK_OFFSET_FILE'] || resolve(dataFolder, 'clock-offset'),
    FAKES_DATA_DIR: env['FAKES_DATA_DIR'] || resolve(dataFolder, 'fakes'),
    FAKES_WEBHOOK_TARGET: env['FAKES_WEBHOOK_TARGET'] || localUrl,
    FAKES_NUMBERS: env['FAKES_NUMBERS'] || demoNumber,
    FAKES_PHONES:
      env['FAKES_PHONES'] ||
      Object.entries(demoPhones)
        .map(([phone, name]) => `${phone}=${name}`)
        .join(','),
  };
}
