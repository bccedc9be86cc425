import { expect, it } from 'vitest';
import { isPrivateAddress } from './private-address.ts';

it.each([
  '127.0.0.1',
  '10.1.2.3',
  '172.16.0.1',
  '172.31.255.255',
  '192.168.1.1',
  '169.254.169.254',
  '100.64.0.1',
  '0.0.0.0',
  '224.0.0.1',
  '255.255.255.255',
  '::1',
  '::',
  'fe80::1',
  'fd00::1',
  '::ffff:10.0.0.1',
  '::ffff:7f00:1',
  '64:ff9b::a00:1',
  '2002:7f00:1::',
  'not an address',
  '',
])('%s lies inside', (address) => {
  expect(isPrivateAddress(address)).toBe(true);
});

it.each(['8.8.8.8', '172.32.0.1', '192.169.0.1', '100.128.0.1', '2606:4700::1111', '::ffff:8.8.8.8'])(
  '%s is of the open internet',
  (address) => {
    expect(isPrivateAddress(address)).toBe(false);
  },
);
