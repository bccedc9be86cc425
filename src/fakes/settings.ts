import { z } from 'zod';

const port = z.coerce.number().int().min(0).max(65_535);
const loopbackHosts = new Set(['127.0.0.1', 'localhost', '[::1]']);

/** An address that the stand-ins may call: they never reach out of this machine. */
const loopbackAddress = z
  .url({ protocol: /^http$/ })
  .refine((address) => loopbackHosts.has(new URL(address).hostname), {
    message: 'must be http on 127.0.0.1, localhost or [::1]',
  });

const schema = z
  .object({
    /** Pages and the text service's API; 0 takes any free port. */
    FAKES_HTTP_PORT: port.default(4311),
    FAKES_SMTP_PORT: port.default(4312),
    /** The product's configured public address: webhooks are signed over it. */
    APP_URL: z.url({ protocol: /^https?$/ }),
    /** Where webhooks are delivered, when the public address is not this machine's. */
    FAKES_WEBHOOK_TARGET: loopbackAddress.optional(),
    /** Folder in which texts and mails outlive a restart; without it they live in memory. */
    FAKES_DATA_DIR: z.string().min(1).optional(),
    /** File with the offset of the product's clock in milliseconds. */
    CLOCK_OFFSET_FILE: z.string().min(1).optional(),
    /** The demo's account: the same values as the product takes when it is given none. */
    TWILIO_ACCOUNT_SID: z
      .string()
      .regex(/^AC[0-9a-f]{32}$/)
      .default(`AC${'0'.repeat(32)}`),
    TWILIO_AUTH_TOKEN: z.string().min(1).default('demo-text-service-key'),
    /** Phones to show before they have a text: `+15550100101=Ana,+15550100102=Minh`. */
    FAKES_PHONES: z.string().default(''),
    /** The shops' numbers, `+12025550100,+12025550101`; a phone without texts writes to the first. */
    FAKES_NUMBERS: z.string().default(''),
    /** Milliseconds from acceptance to "sent", and from there to "delivered". */
    FAKES_STEP_MS: z.coerce.number().int().min(0).max(60_000).default(400),
  })
  .transform((env) => ({
    httpPort: env.FAKES_HTTP_PORT,
    smtpPort: env.FAKES_SMTP_PORT,
    publicUrl: env.APP_URL,
    webhookTarget: env.FAKES_WEBHOOK_TARGET ?? loopbackAddress.parse(env.APP_URL),
    dataFolder: env.FAKES_DATA_DIR,
    clockOffsetFile: env.CLOCK_OFFSET_FILE,
    accountSid: env.TWILIO_ACCOUNT_SID,
    authToken: env.TWILIO_AUTH_TOKEN,
    phones: readPhones(env.FAKES_PHONES),
    numbers: env.FAKES_NUMBERS.split(',').filter((number) => number !== ''),
    stepMilliseconds: env.FAKES_STEP_MS,
  }));

export type FakesSettings = z.output<typeof schema>;

export interface NamedPhone {
  phone: string;
  name: string;
}

function readPhones(list: string): NamedPhone[] {
  return list
    .split(',')
    .filter((entry) => entry !== '')
    .map((entry) => {
      const [phone = '', name = ''] = entry.split('=');
      return { phone: phone.trim(), name: name.trim() };
    });
}

/**
 * Reads the stand-ins' settings.
 * @param env the environment's variables
 * @throws ZodError naming each variable that is missing or malformed
 */
export function readFakesSettings(env: Record<string, string | undefined>): FakesSettings {
  return schema.parse(env);
}
