import { plainDecibels } from '../words/decibels'
import type { Tick } from './geometry'

export type Vertical = {
  readonly zeroY: number
  /** px per dB */
  readonly scale: number
  readonly surfaceY: number
  readonly y: (db: number) => number
}

type Room = { readonly height: number; readonly top: number; readonly ground: number }

/**
 * The scale between 0 dB and the surface. A level that ends under the ground stays in the picture: then the ground grows.
 * @param limitDb decibels at the surface; deepestDb the lowest that the level reaches; riseDb how far above 0 it goes
 */
export function verticalScale(room: Room, limitDb: number, deepestDb: number, riseDb: number): Vertical {
  const toSurface = room.height - room.ground - room.top
  const toBottom = room.height - room.top - 10
  const span = Math.max(limitDb, 1) + riseDb
  const scale = Math.min(toSurface / span, toBottom / (Math.max(deepestDb, 1) + riseDb))
  const zeroY = room.top + riseDb * scale
  return { zeroY, scale, surfaceY: zeroY + limitDb * scale, y: (db) => zeroY + db * scale }
}

/** A levelling staff: a tick every decibel (every fifth where they would merge), a figure where there is room. */
export function staffTicks(vertical: Vertical, limitDb: number | null, deepestDb: number, narrow: boolean): Tick[] {
  const each = vertical.scale >= (narrow ? 16 : 4) ? 1 : 5
  const figures = [1, 2, 5, 10, 20, 50, 100].find((step) => step * vertical.scale >= 38 && step % each === 0) ?? 100
  const last = limitDb ?? deepestDb
  const ticks: Tick[] = []
  for (let db = 0; db <= last + 1e-9; db += each) {
    const y = vertical.y(db)
    const labelled = db % figures === 0 && (limitDb === null || Math.abs(vertical.y(limitDb) - y) >= 15)
    ticks.push({ y, db, long: db % figures === 0 || db % 5 === 0, label: labelled ? String(db) : null })
  }
  if (limitDb !== null) {
    ticks.push({ y: vertical.y(limitDb), db: limitDb, long: true, label: plainDecibels(limitDb) })
  }
  return ticks
}
