'use client'
import { useCallback, useSyncExternalStore } from 'react'
import { placeKey } from '../../../../../lib/sheet/place'
import type { Present } from '../../../../../lib/sheet/wire'
import { useBench } from '../state/contexts'
import type { Draft } from '../state/drafts'
import { usePlace } from '../state/usePlace'
import type { SlipSpec } from './spec'

export type Slip = {
  readonly draft: Draft | null
  /** What stands in the slip: what is being typed, else what the sheet says. */
  readonly text: string
  /** Another person has changed the value since the typing began: what it is now. */
  readonly meanwhile: string | null
  readonly unsaved: boolean
  readonly others: readonly Present[]
  readonly canWrite: boolean
  readonly type: (text: string) => void
  /** Takes what is typed. @returns false where it was not taken; it stays in the slip with its reason. */
  readonly commit: () => boolean
  /** Gives what is typed up. */
  readonly restore: () => void
}

const NOBODY: readonly Present[] = []

/**
 * One slip's life: typing, taking, refusing. Nothing is sent before it is taken.
 * @param key name of its draft: one field may be open in the rows and in the detail, and each keeps its own text
 */
export function useSlip(spec: SlipSpec, key: string = spec.key): Slip {
  const bench = useBench()
  const { drafts } = bench
  const subscribe = useCallback((heard: () => void) => drafts.subscribe(key, heard), [drafts, key])
  const draft = useSyncExternalStore(
    subscribe,
    () => drafts.get(key),
    () => null,
  )
  const place = placeKey(spec.places[0])
  const other = placeKey(spec.places[1] ?? spec.places[0])
  const unsaved = [usePlace(bench.unsaved, place), usePlace(bench.unsaved, other)]
  const here = usePlace(bench.standing, place) ?? NOBODY
  const there = usePlace(bench.standing, other) ?? NOBODY

  const restore = () => drafts.set(key, null)
  return {
    draft,
    text: draft?.text ?? spec.text,
    meanwhile: draft && draft.base !== spec.text && draft.text !== spec.text ? spec.text : null,
    unsaved: unsaved.includes(true),
    others: other === place ? here : [...here, ...there],
    canWrite: bench.canWrite,
    type: (text) => drafts.set(key, { text, base: draft?.base ?? spec.text, reason: null }),
    restore,
    commit: () => {
      const typed = drafts.get(key)
      if (!typed) return true
      // What was opened and left as it was is no edit, even where another person has changed the value meanwhile.
      const untouched = typed.text === typed.base || typed.text === spec.text
      const outcome = untouched ? [] : spec.judge(typed.text, bench.read(), typed.base)
      const reason = 'reason' in outcome ? outcome.reason : outcome.length > 0 ? bench.edit(outcome) : null
      if (reason !== null) {
        drafts.set(key, { ...typed, reason })
        return false
      }
      restore()
      return true
    },
  }
}
