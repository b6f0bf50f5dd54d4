import { roleAllows } from '../../access/identity'
import type { Refusal } from '../gate/refusal'
import { Ration } from '../ration'
import type { Actor } from './queued'
import type { Roster } from './roster'

/** Refusals of the gate's second stage, each of which builds the shadow anew: per person and minute. */
const DEEP_REFUSALS = 3

/** Who may write, at this moment and from memory: asked when an edit comes and again just before its commit. */
export class Admission {
  private readonly deep: Ration

  /** @param valid whether a session or token still holds */
  constructor(
    private readonly roster: Roster,
    private readonly valid: (actor: Actor) => boolean,
    now: () => number,
  ) {
    this.deep = new Ration(DEEP_REFUSALS, 60_000, now)
  }

  /** Why somebody may not write (any more). */
  stopped(actor: Actor): Refusal | null {
    if (!this.valid(actor)) return { code: 'not-allowed', reason: 'You are signed out; sign in again.' }
    const role = this.roster.roleOf(actor.identity.person)
    if (role === null) return { code: 'not-allowed', reason: 'You may not open this budget; ask its owner.' }
    if (roleAllows(role, 'editor')) return null
    return { code: 'read-only', reason: 'You may read this budget, not change it; ask its owner.' }
  }

  /** Why somebody's next edit is not looked at. */
  spent(actor: Actor): Refusal | null {
    if (!this.deep.isSpent(actor.identity.person)) return null
    return { code: 'not-allowed', reason: 'Too many of your edits were refused; wait a minute and reload the page.' }
  }

  /** Counts a refusal that cost much. @returns whether that is still bearable */
  spendDeep(actor: Actor): boolean {
    return this.deep.spend(actor.identity.person)
  }
}
