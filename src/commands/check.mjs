import { begin } from './begin/node-version.mjs';

begin(() => import('./steps/check.mjs'), '0 passed, 1 failed');
