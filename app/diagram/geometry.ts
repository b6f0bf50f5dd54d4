import type { Basis, Grade, Owner, Verdict } from '../../lib/budget/schema'
import type { Present } from '../../lib/sheet/wire'
import type { Texture } from '../marks/texture'

/** Everything in px of the drawing, y downwards; db are losses from the first plane of the allowance. */
export type Point = { readonly x: number; readonly y: number }
export type Box = { readonly x: number; readonly y: number; readonly width: number; readonly height: number }

/** One line of the budget as a stretch of the level. */
export type Piece = {
  readonly id: string
  readonly number: number
  readonly name: string
  readonly place: 'inside' | 'before' | 'after'
  /** What it adds to the sum; null: unknown. Negative: an overlap, a step upwards. */
  readonly countedDb: number | null
  readonly from: Point
  readonly to: Point
  readonly fromDb: number
  readonly toDb: number
  readonly basis: Basis | null
  readonly grade: Grade
  readonly owner: Owner | null
  readonly overlap: boolean
  readonly assembly: string | null
}

export type Tick = { readonly y: number; readonly db: number; readonly long: boolean; readonly label: string | null }
export type Staff = {
  readonly id: string
  readonly x: number
  readonly label: string
  readonly anchor: 'start' | 'middle' | 'end'
  /** The two planes of the allowance are whole staffs with ticks; others stand on the ground and reach the level. */
  readonly bounds: 'from' | 'to' | null
  readonly top: number
  readonly bottom: number
}

export type Run = Box & {
  readonly assembly: string | null
  readonly name: string
  readonly texture: Texture
  /** Decibels of its lines that have a number. */
  readonly knownDb: number
  readonly label: string | null
}

export type Glyph = Point & { readonly id: string; readonly number: number | null; readonly owner: Owner | null }

export type Label = {
  readonly id: string
  readonly x: number
  /** Baseline of the number. */
  readonly y: number
  readonly figure: string
  readonly name: string | null
  readonly size: 'small' | 'middle' | 'large'
  readonly typical: boolean
  /** From under the number to the level, where it stands apart. */
  readonly leader: readonly [Point, Point] | null
}

export type Gap = Box & { readonly id: string; readonly mark: Point }
export type Shelf = {
  readonly id: string
  readonly from: Point
  readonly to: Point
  readonly words: readonly [string, string]
  readonly wordsAt: Point | null
  /** A red post as tall as the excess. */
  readonly post: readonly [Point, Point] | null
}
export type Flag = Point & { readonly person: Present; readonly staff: readonly [Point, Point]; readonly line: string }

export type WasLevel = {
  readonly points: readonly Point[]
  readonly words: readonly string[]
  readonly wordsAt: Point | null
  /** By line: the CSS transform that puts its stretch of the level back where it was. */
  readonly before: ReadonlyMap<string, string>
}

export type LevelGeometry = {
  readonly width: number
  readonly height: number
  readonly narrow: boolean
  readonly plot: Box
  /** px per decibel */
  readonly scale: number
  readonly zeroY: number
  /** Null where there is no limit to draw. */
  readonly surface: { readonly y: number; readonly limitDb: number; readonly broken: boolean } | null
  readonly required: Box | null
  readonly pieces: readonly Piece[]
  readonly joints: readonly Point[]
  /** Upper and lower edge of the grouped tolerance, as one closed outline. */
  readonly band: readonly Point[]
  readonly companions: readonly { readonly id: string; readonly words: string; readonly points: readonly Point[] }[]
  readonly was: WasLevel | null
  readonly staffs: readonly Staff[]
  readonly ticks: readonly Tick[]
  readonly runs: readonly Run[]
  readonly glyphs: readonly Glyph[]
  readonly labels: readonly Label[]
  readonly gaps: readonly Gap[]
  readonly shelves: readonly Shelf[]
  readonly flags: readonly Flag[]
  readonly selected: Box | null
  /** Free sky for decibels by basis, where there is some. */
  readonly legend: Box | null
  readonly end: Point
  readonly verdict: Verdict
}
