// @ts-check
import { runCommand } from '../begin/refusal.mjs';
import { leavingSignals, startChild } from '../machine/child.mjs';
import { installPackages } from '../machine/packages.mjs';
import { makeDataFolder } from './data-folder.mjs';
import { startProgram } from './program.mjs';
import { demoEnvironment, readStartSettings } from './settings.mjs';

await runCommand(async () => {
  await installPackages({ mayInstallTools: false });
  const settings = readStartSettings(process.env);
  makeDataFolder(settings.dataFolder);
  const env = demoEnvironment(settings, { ...process.env, ASTRO_TELEMETRY_DISABLED: '1' });
  const fakes = await startProgram({
    name: 'the stand-in for texts and mail',
    args: ['--import', 'tsx', 'src/fakes/main.ts'],
    env,
  });
  console.log(`The crew's phones  ${fakes.ready['textsUrl']}\nThe mailbox        ${fakes.ready['mailUrl']}`);
  // Astro itself rather than its npm script: a script in between would leave it running when asked to end.
  const pages = startChild({
    command: process.execPath,
    args: ['node_modules/astro/astro.js', 'dev', '--host', settings.host, '--port', settings.port],
    env,
    onOutput: (text) => process.stdout.write(text),
    onErrors: (text) => process.stderr.write(text),
  });
  for (const signal of leavingSignals) process.on(signal, () => void pages.stop(10_000));
  await Promise.race([pages.ended, fakes.ended]);
  await Promise.all([pages.stop(10_000), fakes.stop(10_000)]);
});
