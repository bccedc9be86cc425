import { begin } from './begin/node-version.mjs';

begin(() => import('./data/restore.mjs'));
