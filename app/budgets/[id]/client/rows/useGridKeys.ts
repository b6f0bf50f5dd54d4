'use client'
import { type FocusEvent, type KeyboardEvent, type RefObject, useLayoutEffect, useRef } from 'react'
import { useBench } from '../state/contexts'
import { type Grid, moveIn, nearestRow } from './gridMoves'

type Table = { readonly elements: readonly (readonly HTMLElement[])[]; readonly grid: Grid }

/** Moves the focus among the cells of the rows, and keeps exactly one of them in reach of the Tab key. */
export function useGridKeys(root: RefObject<HTMLElement | null>) {
  const { roving } = useBench()

  const inside = useRef(false)
  const order = useRef<readonly string[]>([])

  useLayoutEffect(() => {
    const known = roving.get()
    const cells = cellsOf(root.current)
    const rows = [...new Set(cells.map((cell) => rowOf(cell.dataset.place)))]
    if (cells.length > 0 && !cells.some((cell) => cell.dataset.place === known)) {
      const row = nearestRow(rowOf(known ?? undefined), order.current, rows)
      const near = cells.find((cell) => rowOf(cell.dataset.place) === row) ?? cells[0]
      roving.set(near?.dataset.place ?? null)
      // The focused cell went with its row: the focus must not fall to the top of the page.
      if (inside.current && document.activeElement === document.body) near?.focus()
    }
    order.current = rows
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
    inside.current = true
    const cell = event.target.closest<HTMLElement>('[data-target]')
    if (cell?.dataset.place) roving.set(cell.dataset.place)
  }
  const onBlur = () => {
    inside.current = false
  }
  return { onKeyDown, onFocus, onBlur }
}

const cellsOf = (root: HTMLElement | null) => [...(root?.querySelectorAll<HTMLElement>('[data-target]') ?? [])]

/** 'lines/id/' of a place. */
const rowOf = (place: string | undefined) => place?.slice(0, place.lastIndexOf('/') + 1) ?? ''

function tableOf(root: HTMLElement): Table {
  const elements = [...root.querySelectorAll<HTMLElement>('[data-row]')].map((row) =>
    [...row.querySelectorAll<HTMLElement>('[data-target]')].filter((cell) => cell.offsetParent !== null),
  )
  return { elements, grid: elements.map((cells) => cells.map((cell) => cell.dataset.target ?? '')) }
}
