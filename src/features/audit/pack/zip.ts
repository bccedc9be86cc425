import { strToU8, zipSync } from 'fflate';

export interface ZipEntry {
  name: string;
  content: string;
}

/** A zip of text files, dated at a moment. */
export function writeZip(entries: readonly ZipEntry[], at: number): Buffer {
  const files = Object.fromEntries(entries.map(({ name, content }) => [name, strToU8(content)]));
  return Buffer.from(zipSync(files, { level: 9, mtime: at }));
}
