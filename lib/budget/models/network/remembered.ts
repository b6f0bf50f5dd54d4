import type { Network } from '../../../channel/networks/network'

/**
 * Remembers what was derived of a network, as long as the network itself is kept: a line is evaluated anew whenever anything of it
 * changes, and a large file takes long to take apart.
 * @returns a function of the network, a key of what else the result rests on, and how it is made
 */
export function rememberedOf<T>(): (of: Network, key: string, make: () => T) => T {
  const kept = new WeakMap<Network, Map<string, T>>()
  return (of, key, make) => {
    const known = kept.get(of) ?? new Map<string, T>()
    kept.set(of, known)
    const found = known.get(key)
    if (found !== undefined) return found
    const made = make()
    known.set(key, made)
    return made
  }
}
