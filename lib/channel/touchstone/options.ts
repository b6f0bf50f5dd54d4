import type { Cursor } from './cursor'
import type { Format, Parameter, Unit } from './file'
import { MOST_PORTS } from './fileName'
import { Unreadable } from './unreadable'

/** What the line that begins with # says. */
export type Options = {
  readonly line: number
  readonly unit: Unit
  readonly parameter: Parameter
  readonly format: Format
  /** Ω: one for all ports (version 1.0) or one for each (1.1). */
  readonly resistances: readonly number[]
}

export const DEFAULT_OPTIONS: Options = { line: 1, unit: 'GHz', parameter: 'S', format: 'MA', resistances: [50] }

/** Powers of ten from the unit to Hz. */
export const EXPONENT: Readonly<Record<Unit, number>> = { Hz: 0, kHz: 3, MHz: 6, GHz: 9 }

const UNITS: Readonly<Record<string, Unit>> = { HZ: 'Hz', KHZ: 'kHz', MHZ: 'MHz', GHZ: 'GHz' }
const PARAMETERS: Readonly<Record<string, Parameter>> = { S: 'S', Y: 'Y', Z: 'Z', H: 'H', G: 'G' }
const FORMATS: Readonly<Record<string, Format>> = { RI: 'RI', MA: 'MA', DB: 'DB' }
const NUMBER = /^[+-]?(\d+\.?\d*|\.\d+)(e[+-]?\d+)?$/i

/** Reads an option line from behind its #: fields in any order and case, each with its default (Touchstone 2.0, 'Option Line'). */
export function readOptions(cursor: Cursor): Options {
  const { line } = cursor
  let unit: Unit | undefined
  let parameter: Parameter | undefined
  let format: Format | undefined
  let resistances: number[] | undefined
  while (cursor.more()) {
    const word = cursor.word()
    const upper = word.toUpperCase()
    if (upper === 'R') resistances = once(line, 'reference', resistances, readResistances(cursor))
    else if (UNITS[upper]) unit = once(line, 'unit of frequency', unit, UNITS[upper])
    else if (PARAMETERS[upper]) parameter = once(line, 'kind of parameter', parameter, PARAMETERS[upper])
    else if (FORMATS[upper]) format = once(line, 'format', format, FORMATS[upper])
    else
      throw new Unreadable(
        line,
        `'${word}' is unknown in an option line; it has a unit (Hz, kHz, MHz, GHz), a parameter (S, Y, Z, H, G), a format (RI, MA, DB) and R with ohms.`,
      )
  }
  return {
    line,
    unit: unit ?? DEFAULT_OPTIONS.unit,
    parameter: parameter ?? DEFAULT_OPTIONS.parameter,
    format: format ?? DEFAULT_OPTIONS.format,
    resistances: resistances ?? DEFAULT_OPTIONS.resistances,
  }
}

function once<T>(line: number, what: string, before: T | undefined, now: T): T {
  if (before !== undefined)
    throw new Unreadable(line, `The option line gives the ${what} twice; leave out the one that is wrong.`)
  return now
}

/** The numbers behind R, up to the first word that is none. */
function readResistances(cursor: Cursor): number[] {
  const resistances: number[] = []
  while (cursor.more()) {
    const before = cursor.at
    const word = cursor.word()
    if (!NUMBER.test(word)) {
      if (/^[-+(\d.]|^[ij]$/i.test(word)) throw notReal(cursor.line, word)
      cursor.at = before
      break
    }
    resistances.push(resistance(cursor.line, Number(word)))
    if (resistances.length > MOST_PORTS)
      throw new Unreadable(
        cursor.line,
        `R has more than ${MOST_PORTS} numbers; write one for all ports or one for each.`,
      )
  }
  if (resistances.length === 0)
    throw new Unreadable(cursor.line, 'R has no number; write the reference in ohms behind it.')
  return resistances
}

/** @param ohm as read. @returns it, where it may be a reference */
export function resistance(line: number, ohm: number): number {
  if (!(ohm > 0 && ohm < Number.POSITIVE_INFINITY))
    throw new Unreadable(line, `A reference of ${ohm} Ω is impossible; it must be above zero.`)
  return ohm
}

function notReal(line: number, word: string): Unreadable {
  return new Unreadable(
    line,
    `'${word}' is no reference in ohms. Touchstone knows only real references: renormalise the data to one, such as 50, before saving.`,
  )
}
