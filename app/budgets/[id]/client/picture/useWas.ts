'use client'
import { useEffect, useState } from 'react'
import type { Budget } from '../../../../../lib/budget/schema'
import type { Present, TrailEntry } from '../../../../../lib/sheet/wire'
import type { Was } from '../../../../diagram/was'
import { signedDecibels } from '../../../../words/decibels'
import { deedsOf } from '../trail/trailWords'

/** How long another person's last change stays in the picture, with its fading (look: 8 s, then 1.6 s). */
const SHOWN_MS = 9_600

type Facts = {
  readonly trail: readonly TrailEntry[]
  readonly person: string
  readonly people: readonly Present[]
  readonly budget: Budget
  readonly allowance: string | null
}

/** Another person's last change to the margin in view, while it is still to be seen. Own edits leave no trace. */
export function useWas({ trail, person, people, budget, allowance }: Facts): Was | null {
  const newest = trail.find((entry) => entry.kind === 'edit') ?? null
  const [since] = useState(newest?.seq ?? 0)
  const [gone, setGone] = useState(0)
  const seq = newest?.seq ?? 0

  useEffect(() => {
    if (seq <= since) return
    const timer = setTimeout(() => setGone(seq), SHOWN_MS)
    return () => clearTimeout(timer)
  }, [seq, since])

  if (!newest || seq <= since || seq <= gone || newest.person === person) return null
  const effect = newest.effects.find((each) => each.allowance === allowance)
  const before = effect?.before?.marginDb
  if (effect === undefined || before == null) return null
  const after = effect.after?.marginDb
  const line = newest.changes.find(({ section }) => section === 'lines')?.id ?? null
  const what = deedsOf(newest, budget)[0]
  return {
    marginDb: before,
    words: [
      `${newest.personName}, just now: ${what?.what ?? 'a change'}`,
      after == null ? 'no margin any more' : `margin ${signedDecibels(after - before)} dB`,
    ].join('\n'),
    line,
    colour: people.find((present) => present.person === newest.person)?.colour ?? 0,
  }
}
