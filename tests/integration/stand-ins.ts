import type { KeptMail } from '../../src/fakes/mail/mailbox.ts';
import { type FakesSettings, readFakesSettings } from '../../src/fakes/settings.ts';
import { type Fakes, startFakes } from '../../src/fakes/start-fakes.ts';
import type { Faults } from '../../src/fakes/text-service/faults.ts';
import type { Delivery, KeptText } from '../../src/fakes/text-service/kept-texts.ts';

export const testAccount = { accountSid: `AC${'1'.repeat(32)}`, authToken: 'token for tests' };

/** The stand-ins for texts and mail, started for one test, with what a test steers them by. */
export interface StandIns extends Fakes {
  setFaults(change: Partial<Faults>): Promise<void>;
  textFromPhone(text: {
    from: string;
    to: string;
    body: string;
    pictures?: { type: string; base64: string }[];
  }): Promise<KeptText>;
  /** All texts, or those after the first so many. */
  texts(from?: number): Promise<KeptText[]>;
  deliveries(): Promise<Delivery[]>;
  mails(): Promise<KeptMail[]>;
}

/**
 * @param publicUrl the product's public address, which need not be this machine's
 * @param change settings that differ, e.g. where webhooks are delivered
 */
export async function startStandIns(
  publicUrl: string,
  change: Partial<FakesSettings> = {},
): Promise<StandIns> {
  const settings = readFakesSettings({
    APP_URL: publicUrl,
    FAKES_WEBHOOK_TARGET: change.webhookTarget ?? publicUrl,
    FAKES_HTTP_PORT: '0',
    FAKES_SMTP_PORT: '0',
    FAKES_STEP_MS: '1',
    TWILIO_ACCOUNT_SID: testAccount.accountSid,
    TWILIO_AUTH_TOKEN: testAccount.authToken,
  });
  const fakes = await startFakes({ ...settings, ...change });

  const ask = async <T>(path: string, body?: unknown): Promise<T> => {
    const options = body === undefined ? {} : { method: 'POST', body: JSON.stringify(body) };
    const response = await fetch(fakes.textsUrl + path, options);
    if (!response.ok) throw new Error(`${path} answered ${response.status}: ${await response.text()}`);
    return (await response.json()) as T;
  };
  return {
    ...fakes,
    setFaults: (change) => ask('/fake/faults', change),
    textFromPhone: (text) => ask('/fake/texts', text),
    texts: (from = 0) => ask(`/fake/texts?from=${from}`),
    deliveries: () => ask('/fake/deliveries'),
    mails: () => ask('/fake/mails'),
  };
}
