import type { AllowanceEvaluation, Evaluation, Flag } from '../../../../../lib/budget/evaluation'
import type { Basis, Budget, Grade, Owner } from '../../../../../lib/budget/schema'
import { plainDecibels } from '../../../../words/decibels'
import { planeWords } from '../../../../words/terms'

/** What a row shows beside what is typed in it. Plain values, so that a row is drawn again only where one of them changed. */
export type LineFacts = {
  /** Its number between the planes of the allowance in view; null outside. */
  readonly number: number | null
  /** What it adds to the sum at the allowance's frequency, in dB (an overlap: negative); outside, its loss at Nyquist. */
  readonly db: number | null
  readonly outside: boolean
  /** What holds for it, also where its own field is empty and its loss class or assembly says it. */
  readonly basis: Basis | null
  readonly grade: Grade
  readonly owner: Owner | null
  readonly problems: number
  readonly flags: number
}

export function lineFacts(
  evaluation: Evaluation,
  allowance: AllowanceEvaluation | null,
): ReadonlyMap<string, LineFacts> {
  const counted = new Map(allowance?.lines.map((line, index) => [line.id, { ...line, number: index + 1 }]))
  const flags = flagsByRecord(evaluation.flags)
  const facts = new Map<string, LineFacts>()
  let position = 0
  for (const row of evaluation.rows) {
    if (!('line' in row)) continue
    position++
    const inside = counted.get(row.line)
    const line = evaluation.lines[row.line]
    const own = flags.get(`lines/${row.line}`) ?? []
    facts.set(row.line, {
      number: inside ? inside.number : allowance?.from && allowance.to ? null : position,
      db: inside ? inside.countedDb : (line?.loss.nominalDb ?? null),
      outside: !inside && Boolean(allowance?.from && allowance.to),
      basis: line?.basis ?? null,
      grade: line?.grade ?? 'nominal',
      owner: line?.owner ?? null,
      problems: own.filter((flag) => flag.severity === 'problem').length,
      flags: own.length,
    })
  }
  return facts
}

/** Flags by 'section/id'. */
export function flagsByRecord(flags: readonly Flag[]): ReadonlyMap<string, readonly Flag[]> {
  const by = new Map<string, Flag[]>()
  for (const flag of flags) {
    const key = `${flag.section}/${flag.id ?? ''}`
    by.set(key, [...(by.get(key) ?? []), flag])
  }
  return by
}

/** What begins or ends at a plane: '28 dB from here to RX ball', 'the allowance Fabric ends'. */
export function planeSays(budget: Budget, evaluation: Evaluation, plane: string): string {
  const several = evaluation.allowances.length > 1
  return evaluation.allowances
    .flatMap(({ from, to, limitDb, name }) => {
      const of = several && name ? `${name}: ` : ''
      if (from === plane && to && limitDb !== null) {
        const end = budget.planes[to]
        return [`${of}${plainDecibels(limitDb)} dB from here to ${end ? planeWords(end) : 'a plane taken out'}`]
      }
      return to === plane ? [several && name ? `${name} ends` : 'the allowance ends'] : []
    })
    .join(' · ')
}
