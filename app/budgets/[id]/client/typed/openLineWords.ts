import {
  BASES,
  GRADES,
  LINE_KINDS,
  type LineKind,
  PLANE_CODES,
  RESERVE_PURPOSES,
} from '../../../../../lib/budget/schema'
import { DIMENSIONS, type Dimension, SPELLINGS } from '../../../../../lib/channel/units/dimensions'
import { wordOf } from '../words/choices'

/** The words that the open line understands: the kinds themselves and what people say for them. */
const SAID: Readonly<Record<string, LineKind>> = {
  stripline: 'trace',
  microstrip: 'trace',
  capacitor: 'component',
  wire: 'cable',
}

export function kindOf(word: string): LineKind | null {
  const small = word.toLowerCase()
  return LINE_KINDS.find((kind) => kind === small) ?? SAID[small] ?? null
}

export type Remark = {
  readonly field: 'basis' | 'grade' | 'purpose' | 'conditionHumidity'
  readonly value: string
}

/** 'measured', 'typical', 'temperature' and the like, standing alone after the number. */
export function remarkOf(word: string, kind: LineKind): Remark | null {
  const small = word.toLowerCase()
  const value = small === 'max' ? 'maximum' : small
  if (kind === 'reserve' && (RESERVE_PURPOSES as readonly string[]).includes(value)) return { field: 'purpose', value }
  if ((BASES as readonly string[]).includes(value)) return { field: 'basis', value }
  if ((GRADES as readonly string[]).includes(value)) return { field: 'grade', value }
  if (value === 'dry' || value === 'wet') return { field: 'conditionHumidity', value }
  return null
}

/** The plane that a text begins with, and what follows it: 'RX ball switch card' → rx-ball, 'switch card'. */
export function planeIn(text: string): { readonly code: string; readonly rest: string } | null {
  const small = text.toLowerCase()
  const names = PLANE_CODES.flatMap((code) =>
    [code.replaceAll('-', ' '), wordOf(code).toLowerCase(), code === 'board-edge' ? 'finger' : code].map((name) => ({
      code,
      name,
    })),
  ).sort((a, b) => b.name.length - a.name.length)
  const found = names.find(({ name }) => small === name || small.startsWith(`${name} `))
  return found ? { code: found.code, rest: text.slice(found.name.length).trim() } : null
}

/** What a number on the open line may be. */
export const NUMBERS = [
  'loss',
  'lossPerLength',
  'length',
  'frequency',
  'capacitance',
  'ratio',
] as const satisfies Dimension[]
export type NumberKind = (typeof NUMBERS)[number]

const units = [
  ...NUMBERS.flatMap((dimension) => Object.keys(DIMENSIONS[dimension].units)),
  ...Object.keys(SPELLINGS),
].sort((a, b) => b.length - a.length)

/** A number, and its unit if one follows at once or after a space; longer units are tried first ('dB/in' before 'dB'). */
export const QUANTITY = new RegExp(
  `^((?:\\d+(?:[.,]\\d+)?|[.,]\\d+)(?:[eE][+-]?\\d+)?)\\s*(${units.map(escaped).join('|')})?(?=$|[\\s,;×*@±])`,
)

function escaped(text: string): string {
  return text.replace(/[.*+?^${}()|[\]\\/]/g, '\\$&')
}
