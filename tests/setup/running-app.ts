import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { type ChildProgram, startProgram } from './child-program.ts';
import { findFreePort } from './free-port.ts';

const built = (name: string) => fileURLToPath(new URL(`../../dist/main/${name}`, import.meta.url));

export interface RunningApp {
  url: string;
  /** Where the demo phones and the demo mailbox can be read; null without stand-ins. */
  textsUrl: string | null;
  mailUrl: string | null;
  dataDir: string;
  app: ChildProgram;
  /** Moves the clock of the app and its stand-ins, in milliseconds from the real time. */
  moveClock(milliseconds: number): void;
  /** Ends all by SIGTERM, takes the data away and answers the app's exit code. */
  stop(): Promise<number | null>;
}

export interface AppWishes {
  /** Start the text and mail stand-ins too. */
  standIns?: boolean;
  env?: Record<string, string>;
}

/** Starts the built product on a free port with a data folder of its own, seeded with the demo shop. */
export async function startApp({ standIns = false, env = {} }: AppWishes = {}): Promise<RunningApp> {
  const folder = mkdtempSync(join(tmpdir(), 'trywell-app-'));
  const dataDir = env['DATA_DIR'] ?? join(folder, 'data');
  const clockFile = join(folder, 'clock-offset');
  const port = String(await findFreePort());
  const url = `http://127.0.0.1:${port}`;
  const shared = {
    APP_URL: url,
    CLOCK_OFFSET_FILE: clockFile,
    TWILIO_ACCOUNT_SID: `AC${'0'.repeat(32)}`,
    TWILIO_AUTH_TOKEN: 'key-of-the-tests',
  };
  const fakes = standIns
    ? await startProgram(built('fakes.mjs'), {
        ...shared,
        FAKES_HTTP_PORT: '0',
        FAKES_SMTP_PORT: '0',
        FAKES_STEP_MS: '1',
      })
    : null;
  const textsUrl = fakes ? String(fakes.ready['textsUrl']) : null;
  const app = await startProgram(built('main.mjs'), {
    ...shared,
    PORT: port,
    DATA_DIR: dataDir,
    TEXTS_PER_SECOND: '100',
    ...(fakes && textsUrl
      ? { TWILIO_API_URL: new URL(textsUrl).origin, SMTP_PORT: String(fakes.ready['smtpPort']) }
      : {}),
    ...env,
  });
  return {
    url,
    textsUrl,
    mailUrl: fakes ? String(fakes.ready['mailUrl']) : null,
    dataDir,
    app,
    moveClock: (milliseconds) => writeFileSync(clockFile, String(milliseconds)),
    async stop() {
      const code = await app.stop();
      await fakes?.stop();
      rmSync(folder, { recursive: true, force: true });
      return code;
    },
  };
}
