// @ts-check
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';

/** The folder that holds package.json, whatever folder the command was called from. */
export const projectFolder = fileURLToPath(new URL('../../..', import.meta.url));

/**
 * @param {...string} parts
 * @returns {string} the absolute path of a place in the project
 */
export function inProject(...parts) {
  return join(projectFolder, ...parts);
}
