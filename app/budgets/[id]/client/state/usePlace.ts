'use client'
import { useCallback, useSyncExternalStore } from 'react'
import type { PlaceMap } from './placeMap'

/** What is known of one place, kept up to date. */
export function usePlace<T>(map: PlaceMap<T>, place: string): T | undefined {
  const subscribe = useCallback((heard: () => void) => map.subscribe(place, heard), [map, place])
  return useSyncExternalStore(
    subscribe,
    () => map.get(place),
    () => undefined,
  )
}
