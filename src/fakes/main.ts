import { readFakesSettings } from './settings.ts';
import { startFakes } from './start-fakes.ts';

/**
 * The process that stands in for the text service and the mail server while nobody has an account with either.
 * Prints one line when it is ready; ends with 0 on SIGTERM or SIGINT.
 */
async function main(): Promise<void> {
  const fakes = await startFakes(readFakesSettings(process.env));
  const { textsUrl, mailUrl, smtpPort } = fakes;
  process.stdout.write(`READY ${JSON.stringify({ textsUrl, mailUrl, smtpPort })}\n`);
  for (const signal of ['SIGTERM', 'SIGINT'] as const) {
    process.once(signal, () => {
      fakes.stop().then(() => process.exit(0));
    });
  }
}

main().catch((error: unknown) => {
  process.stderr.write(`The stand-ins for texts and mail could not start. ${String(error)}\n`);
  process.exit(1);
});
