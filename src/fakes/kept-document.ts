import { readFileSync } from 'node:fs';
import type { z } from 'zod';
import { replaceFile } from './clock.ts';

/** One JSON document in memory, written behind to a file where there is one. */
export interface KeptDocument<T> {
  readonly content: T;
  /** Says that the content changed; the file follows within a moment. */
  changed(): void;
  /** Writes what is not written yet; later changes stay in memory. */
  close(): void;
}

const writeBehindMilliseconds = 100;

/**
 * @param options.file where the document outlives a restart; undefined keeps it in memory
 * @param options.empty the content when there is no file yet
 * @throws ZodError or SyntaxError when the file holds something else: it is never overwritten silently
 */
export function openKeptDocument<T>(options: {
  file: string | undefined;
  schema: z.ZodType<T>;
  empty: T;
}): KeptDocument<T> {
  const { file, schema, empty } = options;
  const content = file === undefined ? empty : readDocument(file, schema, empty);
  let timer: NodeJS.Timeout | undefined;
  let isClosed = false;
  const write = () => {
    clearTimeout(timer);
    timer = undefined;
    if (file !== undefined) replaceFile(file, JSON.stringify(content));
  };
  return {
    content,
    changed: () => {
      if (file !== undefined && !isClosed) timer ??= setTimeout(write, writeBehindMilliseconds);
    },
    close: () => {
      isClosed = true;
      if (timer !== undefined) write();
    },
  };
}

function readDocument<T>(file: string, schema: z.ZodType<T>, empty: T): T {
  let text: string;
  try {
    text = readFileSync(file, 'utf8');
  } catch (error) {
    if (error instanceof Error && 'code' in error && error.code === 'ENOENT') return empty;
    throw error;
  }
  return schema.parse(JSON.parse(text));
}
