// @ts-check
import { runCommand } from '../begin/refusal.mjs';
import { leaveOnSignals } from '../machine/child.mjs';
import { installPackages } from '../machine/packages.mjs';
import { buildProduct } from './product.mjs';

leaveOnSignals();
await runCommand(async () => {
  await installPackages({ mayInstallTools: false });
  await buildProduct();
});
