import { Problem } from './problem'

/**
 * A request that acts by cookie, or that could set one, must come from this server's own pages: Origin equal to the public
 * URL, or, where a browser sends none, Sec-Fetch-Site: same-origin (write path, rule 3). Neither: refused.
 */
export function requireSameOrigin(headers: Headers, publicUrl: string): void {
  const origin = headers.get('origin')
  const same = origin === null ? headers.get('sec-fetch-site') === 'same-origin' : origin === publicUrl
  if (!same) throw new Problem('other-site')
}
