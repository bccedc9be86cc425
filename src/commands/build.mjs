import { begin } from './begin/node-version.mjs';

begin(() => import('./build/build.mjs'));
