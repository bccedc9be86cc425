import { BlockList, isIP, isIPv6 } from 'node:net';

/** Addresses inside a house or a machine: nothing that came by text may make us ask there (RFC 6890 and its updates). */
const inside = new BlockList();
for (const [network, bits] of [
  ['0.0.0.0', 8],
  ['10.0.0.0', 8],
  ['100.64.0.0', 10],
  ['127.0.0.0', 8],
  ['169.254.0.0', 16],
  ['172.16.0.0', 12],
  ['192.0.0.0', 24],
  ['192.0.2.0', 24],
  ['192.168.0.0', 16],
  ['198.18.0.0', 15],
  ['198.51.100.0', 24],
  ['203.0.113.0', 24],
  ['224.0.0.0', 4],
  ['240.0.0.0', 4],
] as const) {
  inside.addSubnet(network, bits, 'ipv4');
}
for (const [network, bits] of [
  ['::', 127],
  ['64:ff9b::', 96],
  ['100::', 64],
  ['2001:db8::', 32],
  ['2002::', 16],
  ['fc00::', 7],
  ['fe80::', 10],
  ['ff00::', 8],
] as const) {
  inside.addSubnet(network, bits, 'ipv6');
}

/** Whether an IP address is not one of the open internet. What is no address at all counts as inside. */
export function isPrivateAddress(address: string): boolean {
  if (isIP(address) === 0) return true;
  const mapped = /^::ffff:(\d+\.\d+\.\d+\.\d+)$/i.exec(address)?.[1];
  if (mapped !== undefined) return isPrivateAddress(mapped);
  // Written another way, an address of the old kind inside one of the new kind is still caught.
  if (/^::ffff:/i.test(address)) return true;
  return inside.check(address, isIPv6(address) ? 'ipv6' : 'ipv4');
}
