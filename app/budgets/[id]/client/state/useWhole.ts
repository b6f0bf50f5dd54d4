'use client'
import { createContext, useContext, useEffect, useSyncExternalStore } from 'react'
import { NO_WHOLE, type Whole, type WholeEvaluation } from '../evaluation/whole'

/** Null until the page lives. */
export const WholeContext = createContext<WholeEvaluation | null>(null)

const noSubscription = () => () => {}
const nothing = () => NO_WHOLE

/**
 * The budget evaluated in full, over frequency and with random builds; computed while a component that uses this is mounted.
 * The last evaluation stays while a newer one is computed.
 */
export function useWhole(): Whole {
  const whole = useContext(WholeContext)
  useEffect(() => whole?.look(), [whole])
  return useSyncExternalStore(whole?.subscribe ?? noSubscription, whole?.getSnapshot ?? nothing, nothing)
}
