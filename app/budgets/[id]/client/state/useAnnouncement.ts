'use client'
import { useEffect, useRef, useState } from 'react'
import type { Budget } from '../../../../../lib/budget/schema'
import type { TrailEntry } from '../../../../../lib/sheet/wire'
import { deedsOf, effectWords } from '../trail/trailWords'

/** What others have just done, in one sentence, for the polite live region. */
export function useAnnouncement(trail: readonly TrailEntry[], person: string, budget: Budget): string {
  const [said, setSaid] = useState('')
  const heard = useRef(trail[0]?.seq ?? 0)
  useEffect(() => {
    const fresh = trail.filter((entry) => entry.seq > heard.current && entry.kind !== 'bind')
    heard.current = Math.max(heard.current, trail[0]?.seq ?? 0)
    const others = fresh.filter((entry) => entry.person !== person)
    if (others.length > 0)
      setSaid(
        others
          .reverse()
          .map((entry) => sentence(entry, budget))
          .join(' '),
      )
  }, [trail, person, budget])
  return said
}

export function sentence(entry: TrailEntry, budget: Budget): string {
  const [first, ...more] = deedsOf(entry, budget)
  const effects = entry.effects.flatMap((effect) => effectWords(effect) ?? [])
  const what = first ? `${first.subject}, ${first.what}` : 'a change'
  const rest = more.length > 0 ? ` and ${more.length} more` : ''
  const effect = effects.map(({ figure, said }) => `; ${figure} dB, ${said}`).join('')
  return `${entry.personName}: ${what}${rest}${effect}.`
}
