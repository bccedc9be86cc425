import { begin } from './begin/node-version.mjs';

begin(() => import('./start/dev.mjs'));
