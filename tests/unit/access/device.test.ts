import { expect, it } from 'vitest'
import { deviceOf } from '#shared/access/device'

// User-Agent strings as these browsers send them (versions shortened); from memory.
it.each([
  ['Mozilla/5.0 (Linux; Android 14) AppleWebKit/537.36 (KHTML, like Gecko) Chrome/140.0 Mobile Safari/537.36', 'Chrome, Android'],
  ['Mozilla/5.0 (iPhone; CPU iPhone OS 17_0 like Mac OS X) AppleWebKit/605.1.15 (KHTML, like Gecko) Version/17.0 Mobile/15E148 Safari/604.1', 'Safari, iPhone'],
  ['Mozilla/5.0 (Windows NT 10.0; Win64; x64) AppleWebKit/537.36 (KHTML, like Gecko) Chrome/140.0 Safari/537.36 Edg/140.0', 'Edge, Windows'],
  ['Mozilla/5.0 (Macintosh; Intel Mac OS X 10.15; rv:130.0) Gecko/20100101 Firefox/130.0', 'Firefox, Mac'],
  ['curl/8.5.0', 'curl/8.5.0'],
  ['<b>odd</b>', ''],
  ['', ''],
])('%s', (userAgent, device) => {
  expect(deviceOf(userAgent)).toBe(device)
})
