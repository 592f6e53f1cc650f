import { BlockList, isIP } from 'node:net'

const near = new BlockList()
// RFC 1122 and RFC 4291 loopback, RFC 1918 and RFC 4193 private, RFC 3927 and RFC 4291 link-local
for (const [net, bits] of [['127.0.0.0', 8], ['10.0.0.0', 8], ['172.16.0.0', 12], ['192.168.0.0', 16], ['169.254.0.0', 16]] as const) near.addSubnet(net, bits, 'ipv4')
for (const [net, bits] of [['::1', 128], ['fc00::', 7], ['fe80::', 10]] as const) near.addSubnet(net, bits, 'ipv6')

/** `::ffff:127.0.0.1` is how a socket for both versions names a peer of the fourth. */
const plain = (address: string): string => address.replace(/^::ffff:(?=\d+\.\d+\.\d+\.\d+$)/i, '').replace(/%.*$/, '')

/** Loopback or private address (no name). */
export function isNear(address: string): boolean {
  const bare = plain(address)
  const version = isIP(bare)
  return version !== 0 && near.check(bare, version === 4 ? 'ipv4' : 'ipv6')
}

/** A host to listen on that is not reached from outside the own network. Not given means all interfaces: not near. */
export const isNearHost = (host: string | undefined): boolean => host === 'localhost' || (host !== undefined && isNear(host))

/** Header fields by which a proxy says for whom it asks. */
export const FORWARDING = ['forwarded', 'x-forwarded-for', 'x-forwarded-host', 'x-forwarded-proto', 'x-real-ip', 'via', 'cf-connecting-ip', 'true-client-ip'] as const

/** From where a request comes: the socket's peer, or what the one trusted proxy (if the peer is it) added last to X-Forwarded-For. */
export function callerAddress(peer: string | undefined, forwardedFor: string | undefined, trustedProxy: string): string {
  const from = plain(peer ?? '')
  if (trustedProxy === '' || from !== plain(trustedProxy)) return from || 'unknown'
  const last = forwardedFor?.split(',').at(-1)?.trim() ?? ''
  return isIP(plain(last)) ? plain(last) : from
}
