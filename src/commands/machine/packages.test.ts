import { expect, it } from 'vitest';
import { doPackagesMatch } from './packages.mjs';

const locked = {
  '': {},
  'node_modules/one': { version: '1.0.0' },
  'node_modules/for-another-machine': { version: '2.0.0', optional: true },
};

it('takes installed packages in their locked versions', () => {
  expect(doPackagesMatch(locked, { 'node_modules/one': { version: '1.0.0' } })).toBe(true);
});

it('finds a package of another version', () => {
  expect(doPackagesMatch(locked, { 'node_modules/one': { version: '1.0.1' } })).toBe(false);
});

it('finds a missing package', () => {
  expect(doPackagesMatch(locked, {})).toBe(false);
});

it('finds an optional package of another version', () => {
  const installed = {
    'node_modules/one': { version: '1.0.0' },
    'node_modules/for-another-machine': { version: '2.1.0' },
  };
  expect(doPackagesMatch(locked, installed)).toBe(false);
});
