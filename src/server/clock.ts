import { readFileSync } from 'node:fs';
import { config } from './env.ts';

const rereadAfter = 200;
let offset = 0;
let readAt = Number.NEGATIVE_INFINITY;

function readOffset(file: string): number {
  try {
    const milliseconds = Number.parseInt(readFileSync(file, 'utf8'), 10);
    return Number.isSafeInteger(milliseconds) ? milliseconds : 0;
  } catch {
    // No file yet: nobody has moved the clock.
    return 0;
  }
}

/** How far the product's clock runs ahead of the machine's, in milliseconds: the content of the offset file, else 0. */
export function clockOffset(): number {
  const file = config().clockOffsetFile;
  if (file === null) return 0;
  const real = Date.now();
  if (Math.abs(real - readAt) > rereadAfter) {
    offset = readOffset(file);
    readAt = real;
  }
  return offset;
}

/**
 * The present moment in milliseconds UTC. In demo mode the offset file moves it, in all processes alike, so that
 * "an hour later" can be tried without waiting.
 */
export function now(): number {
  return Date.now() + clockOffset();
}
