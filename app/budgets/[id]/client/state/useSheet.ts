'use client'
import { useEffect, useMemo, useState, useSyncExternalStore } from 'react'
import type { Budget } from '../../../../../lib/budget/schema'
import type { SheetSession, SheetSnapshot } from '../../../../../lib/sheet/session'
import type { Role, TrailEntry } from '../../../../../lib/sheet/wire'
import type { SheetDeeds, SheetState } from './sheet'
import { holdSheet } from './sheetStore'

/** What the server knew when it made the page. */
export type FirstState = {
  readonly budgetId: string
  readonly person: string
  readonly role: Role
  readonly budget: Budget
  /** Newest first. */
  readonly trail: readonly TrailEntry[]
}

export type Sheet = {
  readonly state: SheetState
  /** Null while what is shown is the server's first state, which cannot be edited. */
  readonly deeds: SheetDeeds | null
}

const noSubscription = () => () => {}
const nothing = () => null

/** The only place where the worksheet meets the session. */
export function useSheet(first: FirstState): Sheet {
  const [session, setSession] = useState<SheetSession | null>(null)
  const { budgetId, person, trail } = first

  // biome-ignore lint/correctness/useExhaustiveDependencies: the first trail belongs to the opening, not to later renders
  useEffect(() => {
    const hold = holdSheet({ budget: budgetId, person, trail })
    let gone = false
    void hold.session.then((opened) => {
      if (!gone) setSession(opened)
    })
    return () => {
      gone = true
      setSession(null)
      hold.release()
    }
  }, [budgetId, person])

  const snapshot = useSyncExternalStore(session?.subscribe ?? noSubscription, session?.getSnapshot ?? nothing, nothing)
  const deeds = useMemo(() => (session ? deedsOf(session, first.budget) : null), [session, first.budget])
  const state = useMemo(() => stateOf(snapshot, first), [snapshot, first])
  return { state, deeds: state.budget === snapshot?.budget ? deeds : null }
}

function deedsOf(session: SheetSession, budget: Budget): SheetDeeds {
  const reasonOf = (result: ReturnType<SheetSession['edit']>) => (result.ok ? null : result.reason)
  return {
    read: () => session.getSnapshot().budget ?? budget,
    edit: (operations) => reasonOf(session.edit(operations)),
    undo: () => reasonOf(session.undo()),
    redo: () => reasonOf(session.redo()),
    stand: session.setCell,
  }
}

/**
 * What this browser keeps may be older than what the server sent with the page: it is shown once the server has been heard,
 * or where it holds something that the server has not.
 */
function stateOf(snapshot: SheetSnapshot | null, first: FirstState): SheetState {
  if (snapshot === null) return { ...UNOPENED, budget: first.budget, role: first.role, trail: first.trail }
  const known = snapshot.budget
  const waiting = known === null || (snapshot.connection.state === 'connecting' && snapshot.unsaved === 0)
  return { ...snapshot, budget: waiting ? first.budget : known, role: snapshot.role ?? first.role }
}

const UNOPENED = {
  generation: 0,
  connection: { state: 'connecting', words: 'Connecting.', code: null },
  unsaved: 0,
  unsavedPlaces: new Set<string>(),
  refused: [],
  people: [],
  lastAcknowledged: null,
  canUndo: false,
  canRedo: false,
  durable: true,
  fault: null,
} as const
