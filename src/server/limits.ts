const kilobyte = 1024;
const megabyte = 1024 * kilobyte;

/** The largest body, in bytes, that each kind of request may carry. */
export const bodyLimits = {
  usual: 64 * kilobyte,
  answers: 256 * kilobyte,
  csv: 2 * megabyte,
  photo: 10 * megabyte,
  trialFile: 5 * megabyte,
} as const;

/** What a picture may unfold to. */
export const photoPixelLimit = 50_000_000;

export const csvRowLimit = 5_000;

const exceptions: [pattern: RegExp, limit: number][] = [
  [/^\/api\/trials\/[^/]+\/answers$/, bodyLimits.answers],
  [/^\/api\/people\/import$/, bodyLimits.csv],
  [/^\/api\/trials\/[^/]+\/readings\/import$/, bodyLimits.csv],
  [/^\/api\/trials\/import$/, bodyLimits.trialFile],
  [/^\/t\/[^/]+\/runs\/[^/]+$/, bodyLimits.photo + 64 * kilobyte],
];

/** The largest body that a request to this path may carry, in bytes. */
export function bodyLimitFor(path: string): number {
  return exceptions.find(([pattern]) => pattern.test(path))?.[1] ?? bodyLimits.usual;
}
