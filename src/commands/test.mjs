import { begin } from './begin/node-version.mjs';

begin(() => import('./steps/test.mjs'), '0 passed, 1 failed');
