import { BlockList, isIP } from 'node:net'

const loopback = new BlockList()
loopback.addSubnet('127.0.0.0', 8, 'ipv4')
loopback.addAddress('::1', 'ipv6')
loopback.addSubnet('::ffff:127.0.0.0', 104, 'ipv6')

/** Whether an IP address belongs to this machine alone (RFC 1122 §3.2.1.3, RFC 4291 §2.5.3). */
export function isLoopbackAddress(address: string): boolean {
  const family = isIP(address)
  return family !== 0 && loopback.check(address, family === 6 ? 'ipv6' : 'ipv4')
}

/** A host as it stands in a URL or a Host header without the brackets of an IPv6 literal. */
export const withoutBrackets = (host: string) => host.replace(/^\[(.*)\]$/, '$1')

/** Whether a host name or address, with or without the brackets of an IPv6 literal, is a loopback name. */
export function isLoopbackName(host: string): boolean {
  const bare = withoutBrackets(host).toLowerCase()
  return bare === 'localhost' || isLoopbackAddress(bare)
}
