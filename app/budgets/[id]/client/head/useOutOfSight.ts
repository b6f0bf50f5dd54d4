'use client'
import { type RefObject, useEffect, useState } from 'react'

/** Whether an element has scrolled out of sight. */
export function useOutOfSight(ref: RefObject<HTMLElement | null>): boolean {
  const [out, setOut] = useState(false)
  useEffect(() => {
    if (!ref.current) return
    const observer = new IntersectionObserver(([entry]) => setOut(entry !== undefined && !entry.isIntersecting))
    observer.observe(ref.current)
    return () => observer.disconnect()
  }, [ref])
  return out
}
