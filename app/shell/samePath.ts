const BASE = 'http://same.site'

/**
 * Where to go after signing in: a path of this site, never another site, whatever the address bar was given.
 * @param wanted as it came in the query; '/' for anything that is not a plain path of ours
 */
export function samePath(wanted: string | readonly string[] | undefined): string {
  if (typeof wanted !== 'string' || !wanted.startsWith('/') || !/^[\x21-\x7e]*$/.test(wanted)) return '/'
  if (wanted.includes('\\')) return '/'
  if (!URL.canParse(wanted, BASE)) return '/'
  const url = new URL(wanted, BASE)
  if (url.origin !== BASE || url.pathname.startsWith('//')) return '/'
  return url.pathname === '/sign-in' || url.pathname.startsWith('/api/') ? '/' : url.pathname + url.search + url.hash
}

/** The sign-in page that leads back to `path`. */
export const signInPath = (path: string): string =>
  path === '/' ? '/sign-in' : `/sign-in?to=${encodeURIComponent(path)}`
