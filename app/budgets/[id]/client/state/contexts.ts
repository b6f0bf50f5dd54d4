'use client'
import { createContext, useContext } from 'react'
import type { Evaluation } from '../../../../../lib/budget/evaluation'
import type { Budget } from '../../../../../lib/budget/schema'
import type { Operation } from '../../../../../lib/sheet/change'
import type { Present } from '../../../../../lib/sheet/wire'
import type { Drafts } from './drafts'
import type { Roving } from './roving'
import type { SheetDeeds } from './sheet'

/** The budget as read and evaluated; changes with every edit of anybody. */
export type Reading = { readonly budget: Budget; readonly evaluation: Evaluation }

/** What does not change while the session lives: the deeds, and where drafts and the focus are kept. */
export type Bench = {
  readonly canWrite: boolean
  readonly drafts: Drafts
  readonly roving: Roving
  readonly read: SheetDeeds['read']
  /** For slips, which show the answer themselves. */
  readonly edit: SheetDeeds['edit']
  /** For buttons and keys: a refusal is told to the person. @returns whether it was done */
  readonly act: (operations: readonly Operation[]) => boolean
  readonly undo: () => void
  readonly redo: () => void
}

/** A line or a plane of the channel. */
export type Selected = { readonly section: 'lines' | 'planes'; readonly id: string }

export type View = {
  readonly budgetId: string
  readonly selected: Selected | null
  readonly select: (row: Selected | null) => void
  /** Where there is no room beside the rows, the detail is a sheet that is opened by hand. */
  readonly detailOpen: boolean
  readonly openDetail: (open: boolean) => void
  /** The allowance in view. */
  readonly allowance: string | null
  readonly showAllowance: (id: string) => void
  /** Puts the focus on a place, wherever on the page it can be typed. */
  readonly goTo: (place: { section: string; id: string | null; field: string | null }) => void
}

export const ReadingContext = createContext<Reading | null>(null)
export const BenchContext = createContext<Bench | null>(null)
export const ViewContext = createContext<View | null>(null)
export const UnsavedContext = createContext<ReadonlySet<string>>(new Set())
/** People other than oneself, by the place that they are at. */
export const OthersContext = createContext<ReadonlyMap<string, readonly Present[]>>(new Map())

export const useReading = () => given(useContext(ReadingContext), 'ReadingContext')
export const useBench = () => given(useContext(BenchContext), 'BenchContext')
export const useView = () => given(useContext(ViewContext), 'ViewContext')

function given<T>(value: T | null, name: string): T {
  if (value === null) throw new Error(`${name} is used outside the worksheet.`)
  return value
}
