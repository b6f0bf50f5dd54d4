import 'server-only'
import { headers } from 'next/headers'
import { redirect } from 'next/navigation'
import type { Identity } from '../../lib/access/identity'
import { services } from '../services'
import { signInPath } from './samePath'

/** Who asks for this page; nobody is led to the sign-in page, and back to `path` from there. */
export async function signedIn(path: string): Promise<Identity> {
  const identity = await services().access.identify(await headers())
  if (!identity) redirect(signInPath(path))
  return identity
}
