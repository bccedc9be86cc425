import type { Source } from './sources.ts';

export const longestFile = 250;

/** Files that are longer, each with the reason why cutting it up would make it harder to read. */
export const explainedLongFiles: Record<string, string> = {};

/** Each file over the limit without a reason, and each reason that no file needs any more. */
export function findLongFiles(sources: Source[], explained: Record<string, string>): string[] {
  const long = new Map(
    sources
      .map(({ path, text }): [string, number] => [path, text.trimEnd().split('\n').length])
      .filter(([, lines]) => lines > longestFile),
  );
  const unexplained = [...long].filter(([path]) => !explained[path]);
  const unneeded = Object.keys(explained).filter((path) => !long.has(path));
  return [
    ...unexplained.map(([path, lines]) => `${path}: ${lines} lines`),
    ...unneeded.map((path) => `${path}: its reason for being long is no longer needed`),
  ];
}
