'use client'
import { useSyncExternalStore } from 'react'
import { useBench } from '../state/contexts'

/** Whether the Tab key reaches this cell; only the two cells that change are drawn again. */
export function useCurrent(key: string): boolean {
  const { roving } = useBench()
  return useSyncExternalStore(
    roving.subscribe,
    () => roving.get() === key,
    () => false,
  )
}
