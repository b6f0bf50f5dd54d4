'use client'
import { type RefObject, useCallback, useLayoutEffect, useMemo, useRef, useState } from 'react'
import type { Evaluation } from '../../../../../lib/budget/evaluation'
import type { Look, Selected, View } from './contexts'
import { focusPlace, type Goal } from './focusPlace'

/** A goal that has not come onto the page by then is given up: the focus must not jump later. */
const PATIENCE_MS = 1_000

/** What outlives a session: which row and allowance one looks at, and where the focus is. */
export type Kept = {
  readonly selected: Selected | null
  readonly select: (row: Selected | null) => void
  readonly chosen: string | null
  readonly showAllowance: (id: string) => void
  readonly focus: { current: Goal | null }
}

export function useKept(): Kept {
  const [selected, select] = useState<Selected | null>(null)
  const [chosen, showAllowance] = useState<string | null>(null)
  const focus = useRef<Goal | null>(null)
  return { selected, select, chosen, showAllowance, focus }
}

/** What this person looks at: nothing of it is shared. */
export function useViewState(
  budgetId: string,
  evaluation: Evaluation,
  root: RefObject<HTMLElement | null>,
  { selected, select, chosen, showAllowance, focus }: Kept,
): { readonly view: View; readonly look: Look } {
  const [detailOpen, openDetail] = useState(false)
  const [, drawAgain] = useState(0)
  const goal = useRef<{ place: Goal; since: number } | null>(null)

  const goTo = useCallback(
    (place: Goal) => {
      const row = rowOf(place)
      if (row) select(row)
      if (row && place.field !== null && !inRows(root.current, place)) openDetail(true)
      goal.current = { place, since: Date.now() }
      drawAgain((turn) => turn + 1)
    },
    [root, select],
  )

  useLayoutEffect(() => {
    if (!goal.current || !root.current) return
    const late = Date.now() - goal.current.since > PATIENCE_MS
    if (focusPlace(root.current, goal.current.place) || late) goal.current = null
  })

  // A session made anew builds the page anew: the focus goes back to where it was.
  useLayoutEffect(() => {
    if (focus.current && root.current && document.activeElement === document.body)
      focusPlace(root.current, focus.current)
  }, [focus, root])

  const known = evaluation.allowances.some(({ id }) => id === chosen)
  const allowance = known ? chosen : (evaluation.allowances[0]?.id ?? null)
  const view = useMemo(
    () => ({ budgetId, selected, detailOpen, allowance }),
    [budgetId, selected, detailOpen, allowance],
  )
  const look = useMemo(() => ({ select, openDetail, showAllowance, goTo }), [select, showAllowance, goTo])
  return { view, look }
}

function rowOf({ section, id }: Goal): Selected | null {
  if (id === null) return null
  if (section === 'lines' || section === 'laneValues') return { section: 'lines', id }
  return section === 'planes' ? { section, id } : null
}

/** Whether the rows themselves show the field; else the detail does. */
function inRows(root: HTMLElement | null, { id, field }: Goal): boolean {
  const row = root?.querySelector(`[data-row="${CSS.escape(id ?? '')}"]`)
  const named = field === 'toleranceMinus' ? 'tolerancePlus' : field
  const cell = row?.querySelector<HTMLElement>(`[data-target="${CSS.escape(named ?? '')}"]`)
  return cell != null && !cell.dataset.place?.endsWith('@row')
}
