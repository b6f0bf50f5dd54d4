import type { LineKind } from '../../../../../lib/budget/schema'
import { isQuantity, parseQuantity } from '../../../../../lib/channel/units'
import { NUMBERS, type NumberKind, QUANTITY, type Remark, remarkOf } from './openLineWords'

/** A record that may be named on the open line. */
export type Named = { readonly id: string; readonly name: string }
export type Known = { readonly assemblies: readonly Named[]; readonly lossClasses: readonly Named[] }

/** What was read from the open line after the kind. */
export type Scan = {
  readonly name: string
  readonly numbers: ReadonlyMap<NumberKind, string>
  readonly bare: string | null
  readonly tolerance: string | null
  readonly remarks: readonly Remark[]
  readonly assembly: string | null
  readonly lossClass: string | null
}

type State = {
  rest: string
  readonly kind: LineKind
  readonly known: Known
  readonly name: string[]
  readonly strange: string[]
  readonly remarks: Remark[]
  readonly numbers: Map<NumberKind, string>
  bare: string | null
  tolerance: string | null
  assembly: string | null
  lossClass: string | null
}

/** A rule takes what it understands from the front of the rest, or answers false, or a sentence why it cannot be. */
type Rule = (state: State) => boolean | string

/**
 * Reads the rest of an open line from left to right. Words before the first number are the line's name, words after it must
 * be known: what is not understood is said, never dropped.
 */
export function scan(text: string, kind: LineKind, known: Known): Scan | { readonly reason: string } {
  const state: State = {
    rest: text.trim(),
    kind,
    known,
    name: [],
    strange: [],
    remarks: [],
    numbers: new Map(),
    bare: null,
    tolerance: null,
    assembly: null,
    lossClass: null,
  }
  while (state.rest !== '') {
    for (const rule of RULES) {
      const outcome = rule(state)
      if (typeof outcome === 'string') return { reason: outcome }
      if (outcome) break
    }
  }
  if (state.strange.length > 0) return { reason: notUnderstood(state.strange) }
  return { ...state, name: state.name.join(' ') }
}

function take(state: State, length: number): string {
  const taken = state.rest.slice(0, length)
  state.rest = state.rest.slice(length).trimStart()
  return taken.trimEnd()
}

const quotedName: Rule = (state) => {
  const quoted = /^["“]([^"”]+)["”]/.exec(state.rest)
  if (!quoted) return false
  state.name.push(quoted[1] ?? '')
  take(state, quoted[0].length)
  return true
}

const tolerance: Rule = (state) => {
  const sign = /^(?:±|\+\/?[−-])\s*/.exec(state.rest)
  if (!sign) return false
  const number = QUANTITY.exec(state.rest.slice(sign[0].length))
  if (!number) return 'Type a number after ±, such as ± 0.15 dB.'
  if (state.tolerance !== null) return 'Type one tolerance.'
  state.tolerance = take(state, sign[0].length + number[0].length)
  return true
}

const number: Rule = (state) => {
  const match = QUANTITY.exec(state.rest)
  if (!match) return false
  const typed = take(state, match[0].length)
  if (match[2] === undefined) {
    if (state.bare !== null) return `Add units to ${state.bare} and ${typed}.`
    state.bare = typed
    return true
  }
  const result = parseQuantity(typed, NUMBERS)
  if (!isQuantity(result)) return result.reason
  const dimension = result.dimension as NumberKind
  const earlier = state.numbers.get(dimension)
  if (earlier !== undefined) return `${earlier} and ${typed} cannot both hold for one line; type one of them.`
  state.numbers.set(dimension, typed)
  return true
}

const unreadableNumber: Rule = (state) => {
  if (!/^[−-]?[.,]?\d/.test(state.rest)) return false
  const word = take(state, wordLength(state.rest))
  return /^[−-]/.test(word)
    ? 'A loss is typed as a positive number of decibels; leave the minus sign out.'
    : `'${word}' is not a number with a unit that fits here; put a name in quotation marks.`
}

/** '×', '@', 'at', commas: they join what stands around them. After × may stand the name of a loss class. */
const joint: Rule = (state) => {
  const mark = /^(?:[×*@,;]|(?:x|at|for|of)(?=\s|$))/i.exec(state.rest)
  if (!mark) return false
  take(state, mark[0].length)
  const lossClass = /[×*x]/i.test(mark[0]) ? longest(state.rest, state.known.lossClasses) : null
  if (lossClass) {
    state.lossClass = lossClass.id
    take(state, lossClass.name.length)
  }
  return true
}

const onAssembly: Rule = (state) => {
  if (!/^on\s/i.test(state.rest)) return false
  take(state, 'on'.length)
  const assembly = longest(state.rest, state.known.assemblies)
  if (!assembly) return `There is no assembly '${state.rest}'; add it under Assemblies, or leave 'on' out.`
  state.assembly = assembly.id
  take(state, assembly.name.length)
  return true
}

const word: Rule = (state) => {
  const text = take(state, wordLength(state.rest))
  const numbered = state.numbers.size > 0 || state.bare !== null
  const remark = numbered || state.kind === 'reserve' ? remarkOf(text, state.kind) : null
  if (remark) state.remarks.push(remark)
  else (numbered ? state.strange : state.name).push(text)
  return true
}

const RULES: readonly Rule[] = [quotedName, tolerance, number, unreadableNumber, joint, onAssembly, word]

const wordLength = (text: string) => /^[^\s,;]+/.exec(text)?.[0].length ?? 1

function longest(text: string, named: readonly Named[]): Named | null {
  const small = text.toLowerCase()
  const fits = named.filter(({ name }) => {
    const own = name.toLowerCase()
    return own !== '' && (small === own || small.startsWith(`${own} `))
  })
  return fits.sort((a, b) => b.name.length - a.name.length)[0] ?? null
}

function notUnderstood(words: readonly string[]): string {
  const quoted = words.map((strange) => `'${strange}'`).join(', ')
  return `Not understood: ${quoted}. A name stands before the number; after it may stand @ frequency, ± tolerance, a basis, a grade, 'on' and an assembly.`
}
