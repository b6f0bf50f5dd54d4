'use client'
import { type FocusEvent, type KeyboardEvent, type RefObject, useLayoutEffect } from 'react'
import { useBench } from '../state/contexts'
import { type Grid, moveIn } from './gridMoves'

type Table = { readonly elements: readonly (readonly HTMLElement[])[]; readonly grid: Grid }

/** Moves the focus among the cells of the rows, and keeps exactly one of them in reach of the Tab key. */
export function useGridKeys(root: RefObject<HTMLElement | null>) {
  const { roving } = useBench()

  useLayoutEffect(() => {
    const known = roving.get()
    const cells = [...(root.current?.querySelectorAll<HTMLElement>('[data-target]') ?? [])]
    if (cells.length > 0 && !cells.some((cell) => cell.dataset.place === known)) {
      const record = known?.slice(0, known.lastIndexOf('/') + 1)
      const near = cells.find((cell) => record !== undefined && cell.dataset.place?.startsWith(record))
      roving.set((near ?? cells[0])?.dataset.place ?? null)
    }
  })

  const onKeyDown = (event: KeyboardEvent) => {
    if (event.altKey || event.metaKey || event.defaultPrevented) return
    const from = event.target instanceof Element ? event.target.closest<HTMLElement>('[data-target]') : null
    if (!from || !root.current) return
    const inControl = event.target !== from
    if (inControl && event.key !== 'Tab') return
    const { elements, grid } = tableOf(root.current)
    const row = elements.findIndex((cells) => cells.includes(from))
    const cell = elements[row]?.indexOf(from) ?? -1
    const held = { ctrl: event.ctrlKey, shift: event.shiftKey }
    const to = row < 0 ? null : moveIn(grid, { row, cell }, event.key, held)
    if (to) {
      event.preventDefault()
      elements[to.row]?.[to.cell]?.focus()
    } else if (event.key.startsWith('Arrow')) event.preventDefault()
  }

  const onFocus = (event: FocusEvent) => {
    const cell = event.target.closest<HTMLElement>('[data-target]')
    if (cell?.dataset.place) roving.set(cell.dataset.place)
  }
  return { onKeyDown, onFocus }
}

function tableOf(root: HTMLElement): Table {
  const elements = [...root.querySelectorAll<HTMLElement>('[data-row]')].map((row) =>
    [...row.querySelectorAll<HTMLElement>('[data-target]')].filter((cell) => cell.offsetParent !== null),
  )
  return { elements, grid: elements.map((cells) => cells.map((cell) => cell.dataset.target ?? '')) }
}
