import type { Judged } from '../allowance/judge'
import type { Context } from '../context'
import type { FlagDraft } from '../flags'
import type { LineItem } from '../lineItem'
import { LOSS, typedValue } from '../quantities'
import { livingRecord, nameOf } from '../record'
import type { PlaneCode } from '../schema'
import type { Check } from './check'

const BALLS: readonly PlaneCode[] = ['tx-ball', 'rx-ball']
const DIES: readonly PlaneCode[] = ['tx-die', 'rx-die']
const INSIDE_PACKAGE: readonly PlaneCode[] = ['tx-bump', 'rx-bump', 'tx-die', 'rx-die']

type Ends = { readonly from: PlaneCode | null; readonly to: PlaneCode | null }

/** Packages against the planes and against what the limit presumes. */
export const packages: Check = function* ({ context, judged }) {
  for (const one of judged) {
    if (one.span.from === null || one.span.to === null) continue
    yield* againstPlanes(context, one, one.span.from, one.span.to)
    yield* againstPresumed(context, one)
  }
}

function* againstPlanes(
  context: Context,
  { evaluation, span }: Judged,
  from: string,
  to: string,
): Generator<FlagDraft> {
  const codeOf = (plane: string) => livingRecord(context.budget, 'planes', plane)?.code ?? null
  const ends = { from: codeOf(from), to: codeOf(to) }
  const name = nameOf('allowances', evaluation.id, evaluation)
  yield* dies(span.items, ends, name)
  yield* missingDies(span.items, ends, evaluation.id, name)
  if (ends.from !== null && ends.to !== null && BALLS.includes(ends.from) && BALLS.includes(ends.to)) {
    for (const item of span.items.filter(isPackage)) {
      yield {
        code: 'package-between-balls',
        section: 'lines',
        id: item.id,
        field: 'order',
        message: `${nameOf('lines', item.id, item.line)} is a package and counts in ${name}, which goes from ball to ball.`,
        todo: 'Move it outside the planes, or choose a limit that contains the packages.',
      }
    }
    return
  }
  if (!isInside(ends.from) && !isInside(ends.to)) return
  const [atFrom, atTo] = sides(span.items, span.items)
  for (const [end, code, there] of [
    ['from', ends.from, atFrom],
    ['to', ends.to, atTo],
  ] as const) {
    if (!isInside(code) || there.length > 0) continue
    yield {
      code: 'no-package-from-bump',
      section: 'allowances',
      id: evaluation.id,
      field: end,
      message: `${name} ${end === 'from' ? 'starts' : 'ends'} at ${code}, and no package lies at that end.`,
      todo: 'Add the package as a line between the planes, or choose the ball as the plane.',
    }
  }
}

/** The die's pad lies outside the bump. */
function* dies(items: readonly LineItem[], ends: Ends, name: string): Generator<FlagDraft> {
  if (ends.from === null || ends.to === null || DIES.includes(ends.from) || DIES.includes(ends.to)) return
  for (const { id, line } of items) {
    if (line.kind !== 'die') continue
    yield {
      code: 'die-outside-planes',
      section: 'lines',
      id,
      field: 'order',
      message: `${nameOf('lines', id, line)} is part of a die and counts in ${name}, which does not reach the die.`,
      todo: 'Move it outside the planes, or choose a limit that contains the die.',
    }
  }
}

/** From a die the pad counts, at either end. */
function* missingDies(items: readonly LineItem[], ends: Ends, id: string, name: string): Generator<FlagDraft> {
  for (const [end, item] of [
    ['from', items[0]],
    ['to', items.at(-1)],
  ] as const) {
    const code = ends[end]
    if (code === null || !DIES.includes(code) || item?.line.kind === 'die') continue
    yield {
      code: 'no-die-from-die',
      section: 'allowances',
      id,
      field: end,
      message: `${name} ${end === 'from' ? 'starts' : 'ends'} at ${code}, and no pad of a die lies at that end.`,
      todo: 'Add the pad capacitance of the die as a line, or choose the bump as the plane.',
    }
  }
}

function isInside(code: PlaneCode | null): boolean {
  return code !== null && INSIDE_PACKAGE.includes(code)
}

/** A package's decibels may lie outside the planes and still be more than the limit presumes. */
function* againstPresumed(context: Context, { evaluation, span, allowance }: Judged): Generator<FlagDraft> {
  const presumed = typedValue(LOSS, allowance.presumedPackage)
  if (presumed === null || evaluation.atHz === null) return
  for (const side of sides(context.items, span.items)) {
    let sum = 0
    for (const item of side) {
      sum += context.losses.at(item, evaluation.atHz, null).nominal ?? 0
    }
    const [first] = side
    if (first === undefined || sum <= presumed + 1e-9) continue
    yield {
      code: 'package-above-presumed',
      section: 'lines',
      id: first.id,
      field: 'loss',
      message: `${side.map(({ id, line }) => nameOf('lines', id, line)).join(' and ')}: ${sum.toFixed(2)} dB of package at one end; ${nameOf('allowances', evaluation.id, evaluation)} presumes at most ${presumed.toFixed(2)} dB.`,
      todo: 'Take the difference off the limit, or have the package improved.',
    }
  }
}

/** Package lines at the transmitter's end and at the receiver's: before and after the first other piece between the planes. */
function sides(items: readonly LineItem[], between: readonly LineItem[]): [LineItem[], LineItem[]] {
  const parting = between.find((item) => !isPackage(item) && item.line.kind !== 'die')
  const middle = parting === undefined ? items.length / 2 : items.indexOf(parting)
  const found = items.map((item, index) => ({ item, index })).filter(({ item }) => isPackage(item))
  return [
    found.filter(({ index }) => index < middle).map(({ item }) => item),
    found.filter(({ index }) => index >= middle).map(({ item }) => item),
  ]
}

function isPackage({ line }: LineItem): boolean {
  return line.kind === 'package'
}
