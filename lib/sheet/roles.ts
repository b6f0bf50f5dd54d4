import type { Role } from './wire'

/** Least first; each role may all that the ones before it may. */
export const ROLE_ORDER: readonly Role[] = ['viewer', 'editor', 'approver', 'owner']

export function roleAllows(role: Role | null, needed: Role): boolean {
  return role !== null && ROLE_ORDER.indexOf(role) >= ROLE_ORDER.indexOf(needed)
}
