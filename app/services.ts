import 'server-only'
import type { Services } from '../lib/sync/services'

const KEY = Symbol.for('halfbaud.services')

/**
 * What the server offers to pages and route handlers. The only place in app that reads globalThis: Next's bundle and the
 * server's share no modules (write path, rule 9). @returns null before the server has published it
 */
export function publishedServices(): Services | null {
  return (Reflect.get(globalThis, KEY) as Services | undefined) ?? null
}

/** The same for pages, which are never asked for before the server is up. @throws Error where it is not */
export function services(): Services {
  const published = publishedServices()
  if (!published) throw new Error('The server has not published its services; start it with npm start, not with next.')
  return published
}
