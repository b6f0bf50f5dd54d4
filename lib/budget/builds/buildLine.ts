import type { Meaning } from '../../channel/statistics'
import type { Response } from './response'

/** What a line counts in a lane, and how far builds may lie away from it. All decibels are those of the line itself, positive. */
export type Variation = {
  readonly nominalDb: number
  /** The tolerance as typed, in dB. */
  readonly minusDb: number
  readonly plusDb: number
  readonly meaning: Meaning
  /** dB to each side that moving in frequency added, counted linearly as a limit, as in RSS. */
  readonly spreadDb: number
  /** How the loss follows the line's varied parameters, and what it is multiplied by: a lane twice as long changes twice as much. */
  readonly response: { readonly of: Response; readonly times: number } | null
}

export type BuildLine = Variation & {
  readonly id: string
  /** What it varies together with; its own id: it varies on its own. */
  readonly group: string
  /** −1: an overlap, which subtracts. */
  readonly sign: 1 | -1
  /** The lanes that differ, by number from 1. */
  readonly lanes: ReadonlyMap<number, Variation>
}

/** The ids of the lines that vary on their own: in every lane for themselves. */
export function ownLines(lines: readonly BuildLine[]): ReadonlySet<string> {
  const members = new Map<string, number>()
  for (const { group } of lines) members.set(group, (members.get(group) ?? 0) + 1)
  return new Set(lines.filter(({ id, group }) => group === id && members.get(group) === 1).map(({ id }) => id))
}
