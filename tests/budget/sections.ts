import type { EvidenceNetwork } from '../../lib/budget/evaluation'
import type { BudgetFile } from '../../lib/budget/schema'
import { network } from '../../lib/channel/networks/network'

/**
 * Line sections by ABCD matrices (Pozar, Microwave Engineering, section 4.4), written once more here in the plainest way, so that
 * checks of evaluate() do not rest on the project's own two-ports.
 */
export type Section = {
  readonly ohm: number
  /** s, one way. */
  readonly delay: number
  /** dB, one way. */
  readonly db?: (hz: number) => number
}

type Complex = readonly [re: number, im: number]
const ONE: Complex = [1, 0]
const NONE: Complex = [0, 0]
const add = ([a, b]: Complex, [c, d]: Complex): Complex => [a + c, b + d]
const mul = ([a, b]: Complex, [c, d]: Complex): Complex => [a * c - b * d, a * d + b * c]
const over = ([a, b]: Complex, [c, d]: Complex): Complex => {
  const size = c * c + d * d
  return [(a * c + b * d) / size, (b * c - a * d) / size]
}
const times = (k: number, [a, b]: Complex): Complex => [k * a, k * b]

/** [A, B, C, D] of one section: cosh γl, Z sinh γl, sinh γl / Z, cosh γl. */
function abcdOf({ ohm, delay, db }: Section, hz: number): readonly [Complex, Complex, Complex, Complex] {
  const nepers = ((db?.(hz) ?? 0) * Math.LN10) / 20
  const turn = 2 * Math.PI * hz * delay
  const cosh: Complex = [Math.cosh(nepers) * Math.cos(turn), Math.sinh(nepers) * Math.sin(turn)]
  const sinh: Complex = [Math.sinh(nepers) * Math.cos(turn), Math.cosh(nepers) * Math.sin(turn)]
  return [cosh, times(ohm, sinh), times(1 / ohm, sinh), cosh]
}

/** S11, S12, S21, S22 of sections in a row, in a reference. */
export function scattering(
  sections: readonly Section[],
  hz: number,
  reference: number,
): readonly [Complex, Complex, Complex, Complex] {
  let [A, B, C, D]: readonly [Complex, Complex, Complex, Complex] = [ONE, NONE, NONE, ONE]
  for (const section of sections) {
    const [p, q, r, s] = abcdOf(section, hz)
    ;[A, B, C, D] = [
      add(mul(A, p), mul(B, r)),
      add(mul(A, q), mul(B, s)),
      add(mul(C, p), mul(D, r)),
      add(mul(C, q), mul(D, s)),
    ]
  }
  const [bn, cn] = [times(1 / reference, B), times(reference, C)]
  const below = add(add(A, bn), add(cn, D))
  const minus = (one: Complex) => times(-1, one)
  return [
    over(add(add(A, bn), add(minus(cn), minus(D))), below),
    over([2, 0], below),
    over([2, 0], below),
    over(add(add(minus(A), bn), add(minus(cn), D)), below),
  ]
}

const sizeDb = ([re, im]: Complex) => -20 * Math.log10(Math.hypot(re, im))

/** −20 log10|S21|, dB. */
export const lossOf = (sections: readonly Section[], hz: number, reference = 100) =>
  sizeDb(scattering(sections, hz, reference)[2])

/** The lesser return loss of both ends, dB. */
export function returnLossOf(sections: readonly Section[], hz: number, reference = 100): number {
  const [s11, , , s22] = scattering(sections, hz, reference)
  return Math.min(sizeDb(s11), sizeDb(s22))
}

/** A two-port file of the sections. */
export function fileOf(sections: readonly Section[], hz: Float64Array, reference = 100): EvidenceNetwork {
  return constantly(hz, (at) => scattering(sections, at, reference).flat(), reference)
}

/** A two-port file of given S11, S12, S21, S22, real and imaginary parts in turn. */
export function constantly(
  hz: Float64Array,
  s: (hz: number) => readonly number[],
  reference = 100,
): EvidenceNetwork & { readonly network: object } {
  return { network: network(2, hz, Float64Array.from([...hz].flatMap(s)), reference) }
}

/** An ideal step of impedance: reflects −r in front, r behind, and loses nothing. */
export const step = (r: number) => {
  const through = Math.sqrt(1 - r * r)
  return [-r, 0, through, 0, through, 0, r, 0]
}

/** An ideal attenuator, matched. */
export const attenuator = (db: number) => {
  const through = 10 ** (-db / 20)
  return [0, 0, through, 0, through, 0, 0, 0]
}

/** The grid of a sweep from 0.05 to 20 GHz, computed once more here, with 10 GHz on it: so nothing lies between points of a file. */
export const GRID = Float64Array.from(
  [...Array.from({ length: 2000 }, (_, k) => (k === 1999 ? 20e9 : 0.05e9 + (19.95e9 * k) / 1999)), 10e9].sort(
    (a, b) => a - b,
  ),
)

/** Equal steps from the step itself. */
export const steps = (step: number, count: number) => Float64Array.from({ length: count }, (_, k) => step * (k + 1))

type Lines = NonNullable<BudgetFile['lines']>
type Files = NonNullable<BudgetFile['evidence']>

/** Files by id, as evidence records and as what was read of them. */
export function evidenceOf(
  files: Readonly<Record<string, EvidenceNetwork | null>>,
  modes: NonNullable<Files[string]['modes']> | null = 'mixed-as-two-ports',
): { readonly evidence: Files; readonly read: Map<string, EvidenceNetwork> } {
  const ids = Object.keys(files)
  const sha256 = (id: string) => `${id}-`.repeat(64).slice(0, 64)
  return {
    evidence: Object.fromEntries(
      ids.map((id) => [id, { order: 'a0', name: `${id}.s2p`, sha256: sha256(id), modes, fixtures: 'none' as const }]),
    ),
    read: new Map(ids.flatMap((id) => (files[id] ? [[sha256(id), files[id]] as const] : []))),
  }
}

/** A line that counts by the file of the same name. */
export function fileLine(order: string, evidence: string, rest: Partial<Lines[string]> = {}): Lines[string] {
  return { order, kind: 'other', model: 'network', taken: 'discrete', basis: 'measured', evidence, ...rest }
}
