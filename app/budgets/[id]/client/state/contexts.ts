'use client'
import { createContext, useContext } from 'react'
import type { Evaluation } from '../../../../../lib/budget/evaluation'
import type { Budget } from '../../../../../lib/budget/schema'
import type { Operation } from '../../../../../lib/sheet/change'
import type { Present } from '../../../../../lib/sheet/wire'
import type { Drafts } from './drafts'
import type { Goal } from './focusPlace'
import type { PlaceMap } from './placeMap'
import type { Roving } from './roving'
import type { SheetDeeds } from './sheet'

/** The budget as read and evaluated; changes with every edit of anybody. */
export type Reading = { readonly budget: Budget; readonly evaluation: Evaluation }

/** What does not change while the session lives: the deeds, and where drafts and the focus are kept. */
export type Bench = {
  readonly canWrite: boolean
  readonly drafts: Drafts
  readonly roving: Roving
  /** People other than oneself, by the place that they are at. */
  readonly standing: PlaceMap<readonly Present[]>
  /** Places whose value the server has not acknowledged yet. */
  readonly unsaved: PlaceMap<true>
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

/** What one looks at. */
export type View = {
  readonly budgetId: string
  readonly selected: Selected | null
  /** Where there is no room beside the rows, the detail is a sheet that is opened by hand. */
  readonly detailOpen: boolean
  /** The allowance in view. */
  readonly allowance: string | null
}

/** How to look at something else; these keep their identity, so that what only leads somewhere is not drawn again. */
export type Look = {
  readonly select: (row: Selected | null) => void
  readonly openDetail: (open: boolean) => void
  readonly showAllowance: (id: string) => void
  /** Puts the focus on a place, wherever on the page it can be typed. */
  readonly goTo: (place: Goal) => void
}

export const ReadingContext = createContext<Reading | null>(null)
export const BenchContext = createContext<Bench | null>(null)
export const ViewContext = createContext<View | null>(null)
export const LookContext = createContext<Look | null>(null)

export const useReading = () => given(useContext(ReadingContext), 'ReadingContext')
export const useBench = () => given(useContext(BenchContext), 'BenchContext')
export const useView = () => given(useContext(ViewContext), 'ViewContext')
export const useLook = () => given(useContext(LookContext), 'LookContext')

function given<T>(value: T | null, name: string): T {
  if (value === null) throw new Error(`${name} is used outside the worksheet.`)
  return value
}
