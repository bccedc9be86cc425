// @ts-check
import { accessSync, constants, mkdirSync } from 'node:fs';
import { Refusal } from '../begin/refusal.mjs';

/**
 * Makes the data folder where it is not there yet: the stand-ins and the log lie in it too, before the product starts.
 * @param {string} dataFolder
 * @throws {Refusal} where it cannot be made or written
 */
export function makeDataFolder(dataFolder) {
  try {
    mkdirSync(dataFolder, { recursive: true });
    accessSync(dataFolder, constants.W_OK);
  } catch {
    throw new Refusal(`The data folder ${dataFolder} cannot be written. Choose another with DATA_DIR.`);
  }
}
