import { pino } from 'pino';
import { config } from './env.ts';

/**
 * What a log line may say. There is no field for a name, a phone number, an address or a reading, so none can be
 * written by accident; `route` is the route's pattern, never the address with its ids and tokens.
 */
export interface LogFields {
  event: string;
  requestId?: string;
  route?: string;
  method?: string;
  status?: number;
  milliseconds?: number;
  code?: string;
  detail?: string;
  job?: string;
  count?: number;
  messageId?: string;
  shopId?: string;
  trialId?: string;
  error?: { name: string; message: string; stack?: string };
}

const toStandardError = 2;
let logger: pino.Logger | undefined;

function pinoLogger(): pino.Logger {
  logger ??= pino(
    { level: config().logLevel, base: { role: config().role } },
    pino.destination({ dest: toStandardError, sync: true }),
  );
  return logger;
}

/** An error as it may stand in the log: messages of database errors are kept free of values (see db/connection). */
export function describeError(error: unknown): NonNullable<LogFields['error']> {
  if (!(error instanceof Error)) return { name: 'unknown', message: typeof error };
  return { name: error.name, message: error.message, ...(error.stack ? { stack: error.stack } : {}) };
}

export const log = {
  debug: (fields: LogFields) => pinoLogger().debug(fields),
  info: (fields: LogFields) => pinoLogger().info(fields),
  warn: (fields: LogFields) => pinoLogger().warn(fields),
  error: (fields: LogFields) => pinoLogger().error(fields),
};
