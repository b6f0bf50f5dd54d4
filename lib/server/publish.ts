import type { Services } from '../sync/services'

const KEY = Symbol.for('halfbaud.services')

/** Next's bundle and this one share no modules; the pages find the services here (write path, rule 9). */
export function publish(services: Services): void {
  Object.defineProperty(globalThis, KEY, { value: services, configurable: true, enumerable: false })
}
