import { plainDecibels } from '../../../../words/decibels'
import { roundTicks } from '../trail/margins'

/** What both charts over frequency have in common, so that they stand exactly one above the other. */
export const MARGIN = { top: 6, right: 12, bottom: 0, left: 0 }
export const TICK = { fill: 'var(--ink-3)', fontSize: 12 }
export const FREQUENCY_AXIS = {
  dataKey: 'ghz',
  type: 'number',
  height: 24,
  tick: TICK,
  stroke: 'var(--rule-2)',
  tickFormatter: (ghz: number) => plainDecibels(ghz),
} as const

/** Decibels from 0 to the given. */
export function decibelAxis(mostDb: number) {
  return {
    domain: [0, mostDb] as [number, number],
    allowDataOverflow: true,
    width: 40,
    tick: TICK,
    stroke: 'var(--rule-2)',
    ticks: roundTicks(0, mostDb),
    tickFormatter: (db: number) => plainDecibels(db),
  }
}

/** Neither a line nor an area has points to touch: the readout serves both charts. */
export const BARE_AREA = { activeDot: false, isAnimationActive: false } as const
export const BARE_LINE = { ...BARE_AREA, dot: false } as const
/** Where the readout stands on a line. */
export const READ_DOT = { r: 4, fill: 'var(--sheet)', stroke: 'var(--signal)', strokeWidth: 2 } as const

/** A word in a drawing, with a rim that keeps it readable on lines and hatching. */
export function word(value: string, position: 'insideTop' | 'insideBottom' | 'insideTopRight') {
  return {
    value,
    position,
    fill: 'var(--ink)',
    fontSize: 12,
    stroke: 'var(--sheet)',
    strokeWidth: 3,
    paintOrder: 'stroke',
  } as const
}

/** Tells which row the pointer is at. */
export function pointer(onRead: (row: number) => void) {
  return ({ activeTooltipIndex }: { readonly activeTooltipIndex?: number | string | null }) => {
    const row = Number(activeTooltipIndex)
    if (activeTooltipIndex != null && Number.isInteger(row)) onRead(row)
  }
}
