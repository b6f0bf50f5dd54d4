import type { Identity } from '../../lib/access/identity'
import type { Door } from '../../lib/sheet/wire'

/** The way that a request came in, as the trail keeps it. */
export function doorOf(identity: Identity): Door {
  return identity.via === 'token' ? 'token' : 'screen'
}
