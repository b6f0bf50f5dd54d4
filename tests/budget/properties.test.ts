import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { evaluate } from '../../lib/budget/evaluate'
import type { AllowanceEvaluation, Evaluation } from '../../lib/budget/evaluation'
import { forgetLosses } from '../../lib/budget/lossMemory'
import { margins } from '../../lib/budget/margins'
import { type Budget, type Line, VERDICTS } from '../../lib/budget/schema'
import { anyBudget } from './anyBudget'
import { line, link } from './links'

const fresh = (budget: Budget) => {
  forgetLosses()
  return evaluate(budget, new Map())
}
const only = (budget: Budget): AllowanceEvaluation => {
  const [allowance] = evaluate(budget, new Map()).allowances
  if (!allowance) throw new Error('no allowance')
  return allowance
}

function deepFreeze<T>(value: T): T {
  if (typeof value === 'object' && value !== null)
    for (const inner of Object.values(Object.freeze(value))) deepFreeze(inner)
  return value
}

describe('any budget', () => {
  it('is evaluated without throwing, without changing it, and survives JSON', () => {
    let withNumbers = 0
    fc.assert(
      fc.property(anyBudget, (budget) => {
        const evaluation = fresh(deepFreeze(budget))
        expect(JSON.parse(JSON.stringify(evaluation))).toEqual(evaluation)
        for (const { message, todo } of evaluation.flags)
          expect(`${message} ${todo}`).not.toMatch(/undefined|null|NaN|\[object/)
        if (evaluation.allowances.some(({ lossDb }) => lossDb !== null && lossDb > 0)) withNumbers++
      }),
      { numRuns: 100 },
    )
    expect(withNumbers).toBeGreaterThan(5)
  })

  it('keeps its own rules', () => {
    fc.assert(
      fc.property(anyBudget, (budget) => evaluate(budget, new Map()).allowances.forEach(keepsRules)),
      { numRuns: 100 },
    )
  })

  it('gives the same with and without what is remembered, edited in place or built anew', () => {
    const edit = fc.tuple(
      fc.constantFrom('a', 'b', 'c'),
      fc.constantFrom<Partial<Line>>(
        { loss: '1 dB' },
        { length: '2 in' },
        { skew: '3 ps' },
        { grade: 'typical' },
        { model: 'stated' },
        { tolerancePlus: '5 %' },
        { at: null },
        { removed: true },
      ),
    )
    fc.assert(
      fc.property(anyBudget, fc.array(edit, { maxLength: 8 }), (budget, edits) => {
        for (const [id, change] of edits) {
          const record = Object.hasOwn(budget.lines, id) ? budget.lines[id] : undefined
          if (record) Object.assign(record, change)
          const remembered = JSON.stringify(evaluate(budget, new Map()))
          expect(JSON.stringify(evaluate(structuredClone(budget), new Map()))).toBe(remembered)
          expect(JSON.stringify(fresh(budget))).toBe(remembered)
        }
      }),
      { numRuns: 30 },
    )
  })

  it('does not depend on the order of keys', () => {
    const backwards = <T extends object>(records: T) => Object.fromEntries(Object.entries(records).reverse()) as T
    const sorted = ({ flags, ...rest }: Evaluation) => ({
      ...rest,
      flags: flags.map((flag) => JSON.stringify(flag)).sort(),
    })
    fc.assert(
      fc.property(anyBudget, (budget) => {
        const other = {
          ...budget,
          lines: backwards(budget.lines),
          planes: backwards(budget.planes),
          laneValues: backwards(budget.laneValues),
        }
        expect(sorted(evaluate(other, new Map()))).toEqual(sorted(evaluate(budget, new Map())))
      }),
      { numRuns: 100 },
    )
  })
})

function keepsRules(allowance: AllowanceEvaluation): void {
  const { verdict, marginDb, lossDb, limitDb, nominalDb, worstDb, rssDb, requiredMarginDb, undecidedLines, words } =
    allowance
  expect(words.startsWith(verdict)).toBe(true)
  if (marginDb !== null) expect(marginDb).toBe((limitDb ?? Number.NaN) - (lossDb ?? Number.NaN))
  if (verdict === 'inside') expect(marginDb).toBeGreaterThanOrEqual(requiredMarginDb - 1e-9)
  if (verdict === 'tight') expect(marginDb).toBeGreaterThanOrEqual(-1e-9)
  if (verdict === 'over') expect(allowance.knownDb).toBeGreaterThan(limitDb ?? Number.NaN)
  if (undecidedLines.length > 0) expect([lossDb, nominalDb, worstDb, rssDb]).toEqual([null, null, null, null])
  const counted = allowance.lines.reduce((sum, one) => sum + (one.countedDb ?? 0), 0)
  const byBasis = Object.values(allowance.byBasis).reduce((sum, db) => sum + db, 0)
  expect(byBasis).toBeCloseTo(counted, 9)
  if (nominalDb !== null) expect(nominalDb).toBeCloseTo(counted, 9)
  const apart = allowance.judged.statistic !== 'nominal'
  if (worstDb !== null && nominalDb !== null && !apart) expect(worstDb).toBeGreaterThanOrEqual(nominalDb - 1e-9)
  expect(margins({ allowances: [allowance] } as unknown as Evaluation)[allowance.id]?.verdict).toBe(verdict)
}

describe('a sum of stated lines', () => {
  const db = fc.integer({ min: 0, max: 4000 }).map((hundredths) => hundredths / 1000)
  const piece = fc.record({ loss: fc.option(db, { freq: 8 }), plus: db, group: fc.constantFrom('x', 'y', 'z') })

  const linesOf = (pieces: readonly { loss: number | null; plus: number; group: string }[]) =>
    Object.fromEntries(
      pieces.map(({ loss, plus, group }, n) => [
        `l${n}`,
        line(`a${n + 1}`, loss === null ? null : `${loss} dB`, { tolerancePlus: `${plus} dB`, group }),
      ]),
    )

  it('is what plain adding gives: nominal, worst, grouped (a second, short way of computing it)', () => {
    fc.assert(
      fc.property(fc.array(piece, { maxLength: 9 }), (pieces) => {
        const found = only(link({ lines: linesOf(pieces) }))
        const known = pieces.filter(({ loss }) => loss !== null)
        const nominal = known.reduce((sum, { loss }) => sum + (loss ?? 0), 0)
        expect(found.knownDb).toBeCloseTo(nominal, 9)
        expect(found.undecidedLines).toHaveLength(pieces.length - known.length)
        if (known.length < pieces.length) return
        expect(found.worstDb).toBeCloseTo(nominal + known.reduce((sum, { plus }) => sum + plus, 0), 9)
        const groups = ['x', 'y', 'z'].map((name) =>
          known.reduce((sum, { plus, group }) => sum + (group === name ? plus : 0), 0),
        )
        expect(found.rssDb).toBeCloseTo(Math.hypot(...groups), 9)
        expect(found.rssDb).toBeLessThanOrEqual((found.worstDb ?? 0) - nominal + 1e-9)
      }),
    )
  })

  it('never gets a better verdict by a larger loss', () => {
    fc.assert(
      fc.property(fc.array(piece, { minLength: 1, maxLength: 9 }), db, (pieces, more) => {
        const before = only(link({ lines: linesOf(pieces) }))
        const [first, ...others] = pieces
        if (!first || first.loss === null) return
        const after = only(link({ lines: linesOf([{ ...first, loss: first.loss + more }, ...others]) }))
        expect(VERDICTS.indexOf(after.verdict)).toBeLessThanOrEqual(VERDICTS.indexOf(before.verdict))
      }),
    )
  })

  it('does not change by a line that was taken out, nor by one outside the planes', () => {
    fc.assert(
      fc.property(
        fc.array(piece, { maxLength: 6 }),
        fc.constantFrom<Partial<Line>>({ removed: true }, { order: 'Zz' }, { order: 'z1' }),
        (pieces, how) => {
          const lines = linesOf(pieces)
          const { lines: _, ...without } = only(link({ lines }))
          const { lines: __, ...withIt } = only(link({ lines: { ...lines, extra: line('a1', '3 dB', how as object) } }))
          expect(withIt).toEqual(without)
        },
      ),
    )
  })
})
