import { readFileSync, renameSync, writeFileSync } from 'node:fs';

/** The time of the whole demo: the machine's, moved by the offset that the product's own clock reads as well. */
export interface SharedClock {
  /** Milliseconds since 1970, UTC. */
  now(): number;
  /** Milliseconds ahead of the machine's clock. */
  offset(): number;
  /** Moves the demo's time; without a file only the stand-ins' own. */
  move(milliseconds: number): void;
}

/**
 * @param offsetFile file that holds milliseconds as a decimal integer; need not exist yet
 * @returns a clock that reads the file each time, since several processes share it
 */
export function openSharedClock(offsetFile: string | undefined): SharedClock {
  let ownOffset = 0;
  const offset = (): number => (offsetFile === undefined ? ownOffset : readOffset(offsetFile));
  return {
    now: () => Date.now() + offset(),
    offset,
    move: (milliseconds) => {
      const moved = offset() + milliseconds;
      if (offsetFile === undefined) ownOffset = moved;
      else replaceFile(offsetFile, String(moved));
    },
  };
}

function readOffset(file: string): number {
  let content: string;
  try {
    content = readFileSync(file, 'utf8').trim();
  } catch {
    return 0;
  }
  return /^-?\d{1,15}$/.test(content) ? Number(content) : 0;
}

/** Writes aside and renames, so that a reader sees the old content or the new, never a part. */
export function replaceFile(file: string, content: string): void {
  const aside = `${file}.${process.pid}.new`;
  writeFileSync(aside, content);
  renameSync(aside, file);
}
