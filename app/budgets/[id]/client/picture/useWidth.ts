'use client'
import { useLayoutEffect, useRef, useState } from 'react'

/** Width of an element in whole px, as long as it is on the page; 0 before it is known. */
export function useWidth<T extends HTMLElement>() {
  const ref = useRef<T>(null)
  const [width, setWidth] = useState(0)
  useLayoutEffect(() => {
    const element = ref.current
    if (!element) return
    setWidth(Math.floor(element.clientWidth))
    const observer = new ResizeObserver(() => setWidth(Math.floor(element.clientWidth)))
    observer.observe(element)
    return () => observer.disconnect()
  }, [])
  return { ref, width }
}
