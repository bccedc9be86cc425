import { begin } from './begin/node-version.mjs';

begin(() => import('./start/up.mjs'));
