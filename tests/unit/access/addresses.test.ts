import { describe, expect, it } from 'vitest'
import { callerAddress, isNear, isNearHost } from '#server/services/addresses'

describe('near addresses', () => {
  it.each(['127.0.0.1', '127.8.8.8', '10.1.2.3', '172.16.0.1', '172.31.255.255', '192.168.1.1', '169.254.0.7', '::1', '::ffff:127.0.0.1', '::ffff:10.0.0.1', 'fd12::1', 'fe80::1%eth0'])('%s is near', address => expect(isNear(address)).toBe(true))
  it.each(['8.8.8.8', '172.32.0.1', '192.169.0.1', '0.0.0.0', '::', '2001:db8::1', '::ffff:8.8.8.8', '', 'localhost', '127.0.0.1.example'])('%s is not', address => expect(isNear(address)).toBe(false))
  it('a host is near by address or as localhost; none at all means every interface', () => {
    expect([isNearHost('localhost'), isNearHost('127.0.0.1'), isNearHost('0.0.0.0'), isNearHost(undefined), isNearHost('')]).toEqual([true, true, false, false, false])
  })
})

describe('from where a request comes', () => {
  it.each([
    ['203.0.113.9', undefined, '', '203.0.113.9'],
    ['203.0.113.9', '198.51.100.1', '', '203.0.113.9'],
    ['203.0.113.9', '198.51.100.1', '10.0.0.2', '203.0.113.9'],
    ['10.0.0.2', '198.51.100.1, 198.51.100.2', '10.0.0.2', '198.51.100.2'],
    ['::ffff:10.0.0.2', '198.51.100.1', '10.0.0.2', '198.51.100.1'],
    ['10.0.0.2', 'nonsense', '10.0.0.2', '10.0.0.2'],
    ['10.0.0.2', undefined, '10.0.0.2', '10.0.0.2'],
    [undefined, undefined, '', 'unknown'],
  ])('peer %s, X-Forwarded-For %s, trusted %s: %s', (peer, forwarded, trusted, expected) => {
    expect(callerAddress(peer, forwarded, trusted)).toBe(expected)
  })
})
