import { resolve } from 'node:path';
import { z } from 'zod';

/** A configuration that cannot be run with; `problems` holds one plain sentence for each variable. */
export class ConfigurationError extends Error {
  constructor(readonly problems: string[]) {
    super(problems.join(' '));
    this.name = 'ConfigurationError';
  }
}

const port = z.coerce.number().int().min(1).max(65_535);
const httpUrl = z.url({ protocol: /^https?$/ });
const optionalText = z.string().trim().min(1).optional();

const variables = z.object({
  APP_MODE: z.enum(['demo', 'live']).default('demo'),
  ROLE: z.enum(['all', 'web', 'worker']).default('all'),
  HOST: z.string().default('127.0.0.1'),
  PORT: port.default(4310),
  APP_URL: httpUrl.optional(),
  DATA_DIR: z.string().default('data'),
  DATABASE_URL: z.url({ protocol: /^postgres(ql)?$/ }).optional(),
  APP_SECRET: optionalText,
  TWILIO_ACCOUNT_SID: optionalText,
  TWILIO_AUTH_TOKEN: optionalText,
  TWILIO_API_URL: httpUrl.optional(),
  SMTP_HOST: optionalText,
  SMTP_PORT: port.optional(),
  SMTP_USER: optionalText,
  SMTP_PASSWORD: optionalText,
  MAIL_FROM: optionalText,
  TRUST_PROXY: z.enum(['yes', 'no']).default('no'),
  LOG_LEVEL: z.enum(['debug', 'info', 'warn', 'error', 'silent']).default('info'),
  CLOCK_OFFSET_FILE: optionalText,
  TEXTS_PER_SECOND: z.coerce.number().positive().max(1000).default(1),
});
type Variables = z.output<typeof variables>;

/** Everything the process may know about where it runs. */
export interface Config {
  mode: 'demo' | 'live';
  role: 'all' | 'web' | 'worker';
  host: string;
  port: number;
  /** The public address, without a slash at the end. Signatures, origins and links are built on it. */
  appUrl: string;
  dataDir: string;
  database: { kind: 'sqlite'; file: string } | { kind: 'postgres'; url: string };
  /** Keys the HMACs of form tokens and of suppressed phone numbers. */
  secret: string;
  texts: { accountSid: string; authToken: string; apiUrl: string | null; perSecond: number };
  mail: { host: string; port: number; user: string | null; password: string | null; from: string };
  trustProxy: boolean;
  logLevel: Variables['LOG_LEVEL'];
  /** A file with milliseconds to add to the clock; only ever set in demo mode. */
  clockOffsetFile: string | null;
}

const loopbackHosts = ['127.0.0.1', 'localhost', '::1'];
const neededWhenLive = [
  'APP_URL',
  'APP_SECRET',
  'TWILIO_ACCOUNT_SID',
  'TWILIO_AUTH_TOKEN',
  'SMTP_HOST',
  'MAIL_FROM',
] as const;

function findProblems(read: Variables): string[] {
  const problems: string[] = [];
  if (Boolean(read.TWILIO_ACCOUNT_SID) !== Boolean(read.TWILIO_AUTH_TOKEN)) {
    problems.push('TWILIO_ACCOUNT_SID and TWILIO_AUTH_TOKEN go together: set both or neither.');
  }
  if (Boolean(read.SMTP_USER) !== Boolean(read.SMTP_PASSWORD)) {
    problems.push('SMTP_USER and SMTP_PASSWORD go together: set both or neither.');
  }
  if (read.APP_MODE === 'demo') {
    if (!loopbackHosts.includes(read.HOST)) {
      problems.push('HOST must be a loopback address in demo mode: demo sign-ins are public.');
    }
    return problems;
  }
  for (const name of neededWhenLive) {
    if (!read[name]) problems.push(`${name} is missing: live mode needs it.`);
  }
  if (read.APP_URL && !read.APP_URL.startsWith('https://')) {
    problems.push('APP_URL must start with https:// in live mode.');
  }
  if (read.APP_SECRET && read.APP_SECRET.length < 32) {
    problems.push('APP_SECRET must have at least 32 letters.');
  }
  if (read.CLOCK_OFFSET_FILE) problems.push('CLOCK_OFFSET_FILE is for demo mode only.');
  return problems;
}

/**
 * Reads and checks the configuration.
 * @throws ConfigurationError naming every variable that is missing, wrong or half set
 */
export function readConfig(source: Record<string, string | undefined> = process.env): Config {
  const set = Object.fromEntries(Object.entries(source).filter(([, value]) => value !== ''));
  const parsed = variables.safeParse(set);
  if (!parsed.success) {
    throw new ConfigurationError(
      parsed.error.issues.map((issue) => `${issue.path.join('.')} is not usable: ${issue.message}.`),
    );
  }
  const read = parsed.data;
  const problems = findProblems(read);
  if (problems.length > 0) throw new ConfigurationError(problems);

  const dataDir = resolve(read.DATA_DIR);
  return {
    mode: read.APP_MODE,
    role: read.ROLE,
    host: read.HOST,
    port: read.PORT,
    appUrl: (read.APP_URL ?? `http://${read.HOST}:${read.PORT}`).replace(/\/+$/, ''),
    dataDir,
    database: read.DATABASE_URL
      ? { kind: 'postgres', url: read.DATABASE_URL }
      : { kind: 'sqlite', file: resolve(dataDir, 'trywell.sqlite') },
    secret: read.APP_SECRET ?? 'demo-secret-that-protects-nothing-real',
    texts: {
      accountSid: read.TWILIO_ACCOUNT_SID ?? `AC${'0'.repeat(32)}`,
      authToken: read.TWILIO_AUTH_TOKEN ?? 'demo-text-service-key',
      apiUrl: read.TWILIO_API_URL ?? (read.APP_MODE === 'demo' ? 'http://127.0.0.1:4311' : null),
      perSecond: read.TEXTS_PER_SECOND,
    },
    mail: {
      host: read.SMTP_HOST ?? '127.0.0.1',
      port: read.SMTP_PORT ?? (read.APP_MODE === 'demo' ? 4312 : 587),
      user: read.SMTP_USER ?? null,
      password: read.SMTP_PASSWORD ?? null,
      from: read.MAIL_FROM ?? 'Trywell <trywell@harrowlane.example>',
    },
    trustProxy: read.TRUST_PROXY === 'yes',
    logLevel: read.LOG_LEVEL,
    clockOffsetFile: read.CLOCK_OFFSET_FILE ?? null,
  };
}

let known: Config | undefined;

/** The configuration of this process, read once. */
export function config(): Config {
  known ??= readConfig();
  return known;
}
