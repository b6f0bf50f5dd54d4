import { Findings } from '../../../lib/budget/findings'
import type { FlagDraft } from '../../../lib/budget/flags'
import type { Model, ModelLoss } from '../../../lib/budget/models/model'
import {
  type Computed,
  DRY_REFERENCE,
  type Piece,
  type Surroundings,
  type Values,
} from '../../../lib/budget/models/piece'
import type { Bound } from '../../../lib/budget/models/validity'
import type { BudgetFile } from '../../../lib/budget/schema'
import { insertionLoss } from '../../../lib/channel/networks'
import { link } from '../links'

export type LineFile = NonNullable<BudgetFile['lines']>[string]
type ClassFile = NonNullable<BudgetFile['lossClasses']>[string]

export type Asked = {
  readonly hz?: number
  readonly reference?: number | null
  readonly surroundings?: Partial<Surroundings>
  readonly lossClass?: Partial<ClassFile>
}

export type Answer = { readonly found: ModelLoss | Computed | null; readonly drafts: readonly FlagDraft[] }

/** One model asked by itself, at 10 GHz in 100 Ω unless said otherwise. */
export function ask(model: Model, fields: Partial<LineFile>, asked: Asked = {}): Answer {
  const { hz = 10e9, reference = 100, surroundings } = asked
  const budget = link({
    lines: { l: { order: 'a1', name: 'Piece', ...fields } },
    lossClasses: asked.lossClass ? { c: { order: 'a0', name: 'L3', ...asked.lossClass } } : {},
  })
  const [line, lossClass] = [budget.lines.l, budget.lossClasses.c ?? null]
  if (line === undefined) throw new Error('The budget has no line.')
  const drafts: FlagDraft[] = []
  const findings = Findings.ofLine('l', line, drafts)
  const found = model({
    line,
    fields: findings,
    lossClass,
    classFields: lossClass && Findings.ofClass(findings, 'c', lossClass),
    budget,
    evidence: new Map(),
    surroundings: { ...DRY_REFERENCE, ...surroundings },
    hz,
    reference,
    symbolRate: 20e9,
    mistake: () => null,
  })
  return { found, drafts }
}

export function computed(answer: Answer): Computed {
  if (answer.found === null || !('build' in answer.found)) throw new Error(JSON.stringify(answer))
  return answer.found
}

export function pieceOf(answer: Answer, changed: Values = {}): Piece {
  const { build, values } = computed(answer)
  return build({ ...values, ...changed })
}

/** dB that a piece counts at one frequency. */
export function counted(piece: Piece, hz: number, reference = 100): number | undefined {
  const at = Float64Array.of(hz)
  return (piece.attenuation === null ? insertionLoss(piece.twoPort(at, reference)) : piece.attenuation(at))[0]
}

/** −20 log10|S21|. */
export function inserted(piece: Piece, hz: number, reference = 100): number | undefined {
  return insertionLoss(piece.twoPort(Float64Array.of(hz), reference))[0]
}

export const codes = ({ drafts }: Answer) => drafts.map(({ code }) => code)

/** One finite end of a bound, with the value of its field just inside and just outside. */
export type Edge = {
  readonly bound: Bound
  readonly end: 'least' | 'most'
  readonly inside: number
  readonly outside: number
}

/** The ends of all bounds, found by walking from the value outwards and bisecting each bound's own figure, all other values as they are. */
export function edgesOf(bounds: readonly Bound[], values: Values): Edge[] {
  return bounds.flatMap((bound) =>
    (['least', 'most'] as const)
      .filter((end) => Number.isFinite(bound[end]) && bound[end] !== 0)
      .map((end) => {
        const figure = (x: number) => bound.figure({ ...values, [bound.field]: x })
        const now = values[bound.field] as number
        const rises = figure(now * 1.01) > figure(now)
        const up = (end === 'most') === rises
        const isOut = (x: number) => (end === 'most' ? figure(x) > bound.most : figure(x) < bound.least)
        let [last, first] = [now, now]
        for (let step = 0; step < 10_000 && !isOut(first); step++)
          [last, first] = [first, first * (up ? 1.01 : 1 / 1.01)]
        for (let step = 0; step < 60; step++) {
          const middle = (last + first) / 2
          if (isOut(middle)) first = middle
          else last = middle
        }
        const away = up ? 1.0001 : 0.9999
        return { bound, end, inside: last / away, outside: first * away }
      }),
  )
}
