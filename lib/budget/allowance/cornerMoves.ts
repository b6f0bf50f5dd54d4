import type { Context } from '../context'
import { type Conditions, holdsIn } from '../corner'
import type { LineItem } from '../lineItem'
import { recomputesTemperature } from '../surroundings'
import type { LaneSum } from './laneSums'

/** What a corner did to the lines between the planes of one lane. */
export type CornerMoves = {
  /** dB that it moved the sum by. */
  readonly movedDb: number
  /** dB of lines that it cannot move although their numbers do not hold there, and which they are. */
  readonly unmovedDb: number
  readonly unmoved: readonly LineItem[]
  /** Lines whose copper is recomputed at the corner's temperature and whose dielectric is not, as nothing says by how much. */
  readonly copperOnly: readonly LineItem[]
}

/** @returns null in the reference corner, and where the corner cannot be judged */
export function movesOf(
  context: Context,
  corner: Conditions | null,
  lane: LaneSum,
  atHz: number | null,
): CornerMoves | null {
  if (corner === null || atHz === null || lane.cornerUnknown !== null) return null
  let movedDb = 0
  let unmovedDb = 0
  const unmoved: LineItem[] = []
  const copperOnly: LineItem[] = []
  for (const { item, sign, loss } of lane.lines) {
    if (sign === 0 || loss.nominal === null) continue
    const before = context.losses.at(item, atHz, null).nominal ?? loss.nominal
    movedDb += sign * (loss.nominal - before)
    if (holdsElsewhere(item, corner) && recomputesTemperature(item.line, corner) && corner.dielectricPerKelvin === null)
      copperOnly.push(item)
    if (loss.nominal !== before || !shouldMove(item, corner)) continue
    unmoved.push(item)
    unmovedDb += loss.nominal
  }
  return { movedDb, unmovedDb, unmoved, copperOnly }
}

/** A part whose number neither holds in the corner already nor is held back on purpose. */
function shouldMove(item: LineItem, corner: Conditions): boolean {
  const { line, lossClass } = item
  if (line.kind === 'reserve' || line.kind === 'overlap') return false
  const { humidity, grade } = holdsIn(line, lossClass)
  const wetter = corner.wet && humidity !== 'wet'
  const otherBuild = corner.fabrication !== 'nominal' && grade !== 'maximum' && line.processIncluded !== true
  return holdsElsewhere(item, corner) || wetter || otherBuild
}

/** At another temperature than the corner's. */
function holdsElsewhere({ line, lossClass }: LineItem, corner: Conditions): boolean {
  const { temperature } = holdsIn(line, lossClass)
  return corner.temperature !== null && (temperature ?? corner.reference) !== corner.temperature
}
