import { BlockList, isIP } from 'node:net';

/*
 * Addresses that are nobody's on the open internet: this machine, the network around it, the metadata service of a cloud
 * (169.254.169.254), test and documentation ranges. IANA's special-purpose registries for IPv4 and IPv6 (RFC 6890), from memory.
 */
const INNER_4 = [
  ['0.0.0.0', 8],
  ['10.0.0.0', 8],
  ['100.64.0.0', 10],
  ['127.0.0.0', 8],
  ['169.254.0.0', 16],
  ['172.16.0.0', 12],
  ['192.0.0.0', 24],
  ['192.0.2.0', 24],
  ['192.88.99.0', 24],
  ['192.168.0.0', 16],
  ['198.18.0.0', 15],
  ['198.51.100.0', 24],
  ['203.0.113.0', 24],
  ['224.0.0.0', 3],
] as const;

/** Within 2000::/3, the only range given out so far: protocols, documentation, and 6to4, which hides an IPv4 address. */
const INNER_6 = [
  ['2001::', 23],
  ['2001:db8::', 32],
  ['2002::', 16],
  ['3fff::', 20],
] as const;

const inner = new BlockList();
for (const [net, bits] of INNER_4) inner.addSubnet(net, bits, 'ipv4');
for (const [net, bits] of INNER_6) inner.addSubnet(net, bits, 'ipv6');
const givenOut = new BlockList();
givenOut.addSubnet('2000::', 3, 'ipv6');

/** True unless the IP address is a public one; anything that is no IP address counts as inner. */
export function isInner(address: string): boolean {
  const kind = isIP(address);
  if (kind === 4) return inner.check(address, 'ipv4');
  return kind !== 6 || address.includes('%') || !givenOut.check(address, 'ipv6') || inner.check(address, 'ipv6');
}
