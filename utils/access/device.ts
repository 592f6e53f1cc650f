const BROWSERS = [['Edg', 'Edge'], ['OPR', 'Opera'], ['SamsungBrowser', 'Samsung Internet'], ['Firefox', 'Firefox'], ['FxiOS', 'Firefox'], ['CriOS', 'Chrome'], ['Chrome', 'Chrome'], ['Safari', 'Safari']] as const
const SYSTEMS = [['Android', 'Android'], ['iPhone', 'iPhone'], ['iPad', 'iPad'], ['Windows', 'Windows'], ['Mac OS X', 'Mac'], ['CrOS', 'ChromeOS'], ['Linux', 'Linux']] as const

/**
 * `Firefox, Android`: enough for people to recognise their own device, from a User-Agent header. Order matters: most browsers
 * also name those they descend from. Anything else: the first word of the header.
 */
export function deviceOf(userAgent: string): string {
  const browser = BROWSERS.find(([token]) => userAgent.includes(token))?.[1]
  const system = SYSTEMS.find(([token]) => userAgent.includes(token))?.[1]
  return [browser, system].filter(Boolean).join(', ') || userAgent.replace(/[^\w./-]+.*$/s, '').slice(0, 60)
}
