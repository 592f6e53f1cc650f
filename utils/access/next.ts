/** Where to go after signing in: a path of this site, or the first page. `//host` and `/\host` would lead elsewhere. */
export function samePath(next: unknown): string {
  // eslint-disable-next-line no-control-regex -- browsers drop tabs and line breaks, which can hide a second slash
  return typeof next === 'string' && /^\/(?![/\\])[^\\\u0000-\u0020]*$/.test(next) ? next : '/'
}
