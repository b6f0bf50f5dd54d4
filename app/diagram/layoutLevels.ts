import type { AllowanceEvaluation, Evaluation } from '../../lib/budget/evaluation'
import type { Budget } from '../../lib/budget/schema'
import type { Present } from '../../lib/sheet/wire'
import { cornerWords } from '../words/judged'
import { PROOF_ORDER } from '../words/terms'
import { groupedBand } from './band'
import { companionsOf, threeSigma } from './companions'
import type { Box, LevelGeometry, Piece, Point } from './geometry'
import { cumulate, highestLevel, horizontalEdges, piecesOf } from './pieces'
import { flagsOf } from './placeFlags'
import { glyphsOf, runsOf } from './placeGround'
import { labelsOf } from './placeLabels'
import { shelvesOf } from './placeShelves'
import { staffsOf } from './placeStaffs'
import { type SpanLine, spanOf } from './span'
import { overlaps } from './text'
import { staffTicks, type Vertical, verticalScale } from './vertical'
import type { Was } from './was'
import { wasLevelOf } from './wasLevel'

export const NARROW = 640
const AXIS = 40
const STUB = 28

export type LevelSize = { readonly width: number; readonly height: number }
export type LevelState = {
  readonly selected: string | null
  readonly present: readonly Present[]
  readonly was: Was | null
}

/**
 * The level diagram as geometry: what lies where, in px. It adds up what the evaluation counted, for the picture only;
 * no verdict, margin or loss is found here.
 * @param allowanceId the allowance in view; 0 dB is at its first plane
 */
export function layoutLevels(
  evaluation: Evaluation,
  budget: Budget,
  allowanceId: string,
  size: LevelSize,
  state: LevelState,
): LevelGeometry {
  const narrow = size.width < NARROW
  const { lines, planes, allowance } = spanOf(evaluation, budget, allowanceId)
  const outside = lines.some((line) => line.place !== 'inside')
  const stub = outside ? (narrow ? 14 : STUB) : 0
  const left = AXIS + stub
  const right = size.width - 14 - stub
  const inside = lines.filter((line) => line.place === 'inside')
  const band = groupedBand(inside, allowance && threeSigma(allowance))

  const limitDb = allowance?.limitDb ?? null
  const reach = levelsReached(lines)
  const ground = Math.min(narrow ? 58 : 74, size.height * 0.24)
  const top = Math.min(narrow ? 50 : 74, size.height * 0.2)
  const vertical = verticalScale(
    { height: size.height, top, ground },
    limitDb ?? reach.deepest * 1.15,
    reach.deepest,
    reach.rise,
  )
  const pieces = piecesOf(lines, horizontalEdges(lines, { left, right, stub }), vertical)
  const within = pieces.filter((piece) => piece.place === 'inside')
  const plot: Box = { x: left, y: 24, width: right - left, height: vertical.surfaceY - 24 }
  const end = within[within.length - 1]?.to ?? { x: left, y: vertical.zeroY }

  const companions = allowance ? companionsOf(evaluation, allowance) : []
  const gaps = gapsOf(within, vertical.surfaceY)
  const staffs = staffsOf(planes, pieces, budget, allowance, { plot, bottom: size.height, right })
  const { labels, boxes } = labelsOf(within, {
    plot,
    narrow,
    selected: state.selected,
    air: airAbove(within, band, vertical.scale),
    taken: gaps.map((gap) => ({ x: gap.mark.x - 6, y: gap.mark.y - 16, width: 12, height: 18 })),
  })
  const flags = flagsOf(state.present, pieces, plot, vertical.surfaceY)
  const picked = pieces.find((piece) => piece.id === state.selected)
  const requiredDb = allowance?.requiredMarginDb ?? 0
  return {
    ...size,
    narrow,
    plot,
    scale: vertical.scale,
    zeroY: vertical.zeroY,
    surface:
      limitDb === null
        ? null
        : { y: vertical.surfaceY, limitDb, broken: allowance?.from == null || allowance.to == null },
    required:
      limitDb !== null && requiredDb > 0
        ? { x: left, y: vertical.y(limitDb - requiredDb), width: plot.width, height: requiredDb * vertical.scale }
        : null,
    pieces,
    joints: within.length > 24 ? [] : jointsOf(within),
    band: bandOutline(within, band, vertical.scale),
    companions: companions.map((one) => ({
      id: one.id,
      words: `same, ${cornerWords(one, budget)}`,
      points: levelOf(one, within, vertical),
    })),
    was: wasLevelOf(state.was, within, allowance, { scale: vertical.scale, plot, flags, narrow }),
    staffs,
    ticks: staffTicks(vertical, limitDb, reach.deepest, narrow),
    runs: runsOf(within, budget, vertical.surfaceY, size.height),
    glyphs: glyphsOf(within, vertical.surfaceY + 17, { left, right }),
    labels,
    gaps,
    shelves: shelvesOf(allowance?.shares ?? [], within, vertical, narrow),
    flags,
    selected: picked
      ? { x: picked.from.x, y: plot.y, width: Math.max(picked.to.x - picked.from.x, 3), height: plot.height }
      : null,
    legend: narrow ? null : legendRoom(allowance, companions.length, within, plot, boxes),
    end,
    verdict: allowance?.verdict ?? 'undecided',
  }
}

function levelsReached(lines: readonly SpanLine[]): { deepest: number; rise: number } {
  const levels = cumulate(lines)
  const inside = levels.filter((_, at) => lines[at]?.place === 'inside').flat()
  return { deepest: Math.max(0, ...inside), rise: Math.max(0, -Math.min(0, ...inside)) }
}

function jointsOf(pieces: readonly Piece[]): Point[] {
  const first = pieces[0]
  return first ? [first.from, ...pieces.map((piece) => piece.to)] : []
}

function bandOutline(pieces: readonly Piece[], band: readonly { up: number; down: number }[], scale: number): Point[] {
  const points = jointsOf(pieces)
  if (!band.some((at) => at.up > 0 || at.down > 0)) return []
  const upper = points.map(({ x, y }, at) => ({ x, y: y - (band[at]?.up ?? 0) * scale }))
  const lower = points.map(({ x, y }, at) => ({ x, y: y + (band[at]?.down ?? 0) * scale }))
  return [...upper, ...lower.reverse()]
}

/** How many px the tolerance stands above the level at x. */
function airAbove(pieces: readonly Piece[], band: readonly { up: number }[], scale: number): (x: number) => number {
  return (x) => {
    const at = pieces.findIndex((piece) => x <= piece.to.x)
    return scale * (band[at < 0 ? band.length - 1 : at + 1]?.up ?? 0)
  }
}

/** A line without a number: a hatched gap that does not reach the ground, so that it is not read as loss. */
function gapsOf(pieces: readonly Piece[], surfaceY: number) {
  return pieces
    .filter((piece) => piece.countedDb === null)
    .map((piece) => ({
      id: piece.id,
      x: piece.from.x,
      y: piece.from.y,
      width: piece.to.x - piece.from.x,
      height: Math.max(Math.min(46, surfaceY - piece.from.y - 8), 8),
      mark: { x: (piece.from.x + piece.to.x) / 2, y: piece.from.y - 8 },
    }))
}

function levelOf(companion: AllowanceEvaluation, pieces: readonly Piece[], vertical: Vertical): Point[] {
  const counted = new Map(companion.lines.map((line) => [line.id, line.countedDb ?? 0]))
  let db = 0
  return jointsOf(pieces).map((point, at) => {
    if (at > 0) db += counted.get(pieces[at - 1]?.id ?? '') ?? 0
    return { x: point.x, y: vertical.y(db) }
  })
}

const LEGEND_WIDTH = 290
export const LEGEND_ROW = 21

/** Decibels by basis stand in the sky on the right, if the level leaves it free. */
function legendRoom(
  allowance: AllowanceEvaluation | null,
  companions: number,
  pieces: readonly Piece[],
  plot: Box,
  taken: readonly Box[],
): Box | null {
  const rows = PROOF_ORDER.filter((basis) => (allowance?.byBasis[basis] ?? 0) > 0).length + companions
  const box = {
    x: plot.x + plot.width - LEGEND_WIDTH - 16,
    y: plot.y + 6,
    width: LEGEND_WIDTH,
    height: rows * LEGEND_ROW,
  }
  if (rows === 0 || plot.width < LEGEND_WIDTH * 1.6) return null
  const free = highestLevel(pieces, box.x, box.x + box.width) - 20 > box.y + box.height
  return free && !taken.some((other) => overlaps(box, other, 6)) ? box : null
}
