import type { Revoked } from './service'

export type Revocations = {
  announce(revoked: Revoked): void
  onRevoked(callback: (revoked: Revoked) => void): () => void
}

/** Tells everybody who asked what has been revoked. One listener's failure keeps none of the others from hearing of it. */
export function createRevocations(log: (message: string, error: unknown) => void): Revocations {
  const callbacks = new Set<(revoked: Revoked) => void>()
  return {
    announce(revoked) {
      for (const callback of callbacks) {
        try {
          callback(revoked)
        } catch (error) {
          log('A listener failed at a revocation', error)
        }
      }
    },
    onRevoked(callback) {
      callbacks.add(callback)
      return () => callbacks.delete(callback)
    },
  }
}
