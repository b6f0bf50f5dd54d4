import type { Identity } from '../../lib/access/identity'
import { roleAllows } from '../../lib/sheet/roles'
import type { Services } from '../../lib/sync/services'
import type { Admission } from './declaration'
import { requireSameOrigin } from './origin'
import { Problem } from './problem'

/**
 * Lets in who may call an operation. A budget that does not exist and one that the person is no member of are answered
 * alike, and before anything else of the request is looked at.
 * @param budget id in the address, for operations that need a role
 * @returns the person, or null where the operation is open
 */
export async function admit(
  services: Services,
  request: Request,
  admission: Admission,
  changes: boolean,
  budget: string | undefined,
): Promise<Identity | null> {
  const identity = admission === 'open' ? null : await services.access.identify(request.headers)
  if (changes && identity?.via !== 'token') requireSameOrigin(request.headers, services.publicUrl)
  if (admission === 'open') return null
  if (!identity) throw new Problem('not-signed-in')
  if (admission === 'session' && identity.via !== 'cookie') throw new Problem('needs-session')
  if (admission === 'administrator' && !identity.administrator) throw new Problem('needs-administrator')
  if (typeof admission === 'object') {
    const role = budget === undefined ? null : await services.access.role(identity.person, budget)
    if (role === null) throw new Problem('not-found')
    if (!roleAllows(role, admission.role)) throw new Problem('not-allowed')
  }
  return identity
}
