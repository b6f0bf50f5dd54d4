'use client'
import { useCallback, useLayoutEffect, useMemo, useState } from 'react'
import { roleAllows } from '../../../../lib/sheet/roles'
import type { Present } from '../../../../lib/sheet/wire'
import { Announcer } from './head/Announcer'
import { Sheet } from './Sheet'
import { type Bench, BenchContext, ReadingContext } from './state/contexts'
import { createDrafts } from './state/drafts'
import { evaluated } from './state/evaluated'
import { othersByPlace } from './state/othersByPlace'
import { createPlaceMap } from './state/placeMap'
import { createRoving } from './state/roving'
import { useAnnouncement } from './state/useAnnouncement'
import { useEvaluator } from './state/useEvaluator'
import { type FirstState, useSheet } from './state/useSheet'
import { useKept } from './state/useView'
import { WholeContext } from './state/useWhole'

/**
 * The worksheet of one budget. What must outlive a session (drafts, where the focus is) is kept here; the sheet below is
 * built anew for each generation of it.
 */
export function Worksheet({ first }: { first: FirstState }) {
  const { state, deeds } = useSheet(first)
  const [drafts] = useState(createDrafts)
  const [roving] = useState(createRoving)
  const kept = useKept()
  const [refusal, setRefusal] = useState<string | null>(null)
  const said = useAnnouncement(state.trail, first.person, state.budget)
  const [standing] = useState(createPlaceMap<readonly Present[]>)
  const [unsaved] = useState(createPlaceMap<true>)
  useLayoutEffect(() => standing.replace(othersByPlace(state.people)), [standing, state.people])
  useLayoutEffect(
    () => unsaved.replace(new Map([...state.unsavedPlaces].map((place) => [place, true]))),
    [unsaved, state.unsavedPlaces],
  )
  const canWrite = deeds !== null && roleAllows(state.role, 'editor') && state.connection.state !== 'closed'

  const tell = useCallback((reason: string | null) => {
    setRefusal(reason)
    return reason === null
  }, [])
  const firstBudget = first.budget
  const bench = useMemo<Bench>(
    () => ({
      canWrite,
      drafts,
      roving,
      standing,
      unsaved,
      read: () => deeds?.read() ?? firstBudget,
      edit: (operations) => (deeds ? deeds.edit(operations) : NOT_YET),
      act: (operations) => tell(deeds ? deeds.edit(operations) : NOT_YET),
      undo: () => tell(deeds ? deeds.undo() : NOT_YET),
      redo: () => tell(deeds ? deeds.redo() : NOT_YET),
    }),
    [canWrite, drafts, roving, standing, unsaved, deeds, firstBudget, tell],
  )
  const { budget } = state
  const { networks, whole } = useEvaluator(first.budgetId, budget)
  const reading = useMemo(() => ({ budget, evaluation: evaluated(budget, networks) }), [budget, networks])

  return (
    <ReadingContext value={reading}>
      <BenchContext value={bench}>
        <WholeContext value={whole}>
          <Sheet
            key={Math.max(1, state.generation)}
            first={first}
            state={state}
            kept={kept}
            stand={deeds?.stand ?? null}
          />
          <Announcer said={said} refusal={refusal} onHeard={() => setRefusal(null)} />
        </WholeContext>
      </BenchContext>
    </ReadingContext>
  )
}

const NOT_YET = 'The worksheet is being loaded; try again in a moment.'
