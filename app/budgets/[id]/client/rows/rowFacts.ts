import type { AllowanceEvaluation, Evaluation, Flag } from '../../../../../lib/budget/evaluation'
import { type Basis, type Budget, type Grade, LANE_FIELDS, type Owner } from '../../../../../lib/budget/schema'
import { plainDecibels } from '../../../../words/decibels'
import { planeWords } from '../../../../words/terms'
import { laneCounts } from '../detail/lanesOf'
import { showTolerance } from '../typed/tolerance'
import { labelOf } from '../words/labels'

/** What a row shows beside what is typed in it. Plain values, so that a row is drawn again only where one of them changed. */
export type LineFacts = {
  /** Its place among the lines, as in the level diagram: the same in whatever allowance is in view. */
  readonly number: number
  /** What it adds to the sum at the allowance's frequency, in dB (an overlap: negative); outside, its loss at Nyquist. */
  readonly db: number | null
  readonly outside: boolean
  /** What holds for it, also where its own field is empty and its loss class or assembly says it. */
  readonly basis: Basis | null
  readonly grade: Grade
  readonly owner: Owner | null
  /** Its loss class's tolerance, where it has none of its own. */
  readonly classTolerance: string | null
  /** Which of its slips do not speak for all lanes, in words, or ''. */
  readonly lanes: string
  readonly problems: number
  readonly flags: number
}

export function lineFacts(
  budget: Budget,
  evaluation: Evaluation,
  allowance: AllowanceEvaluation | null,
): ReadonlyMap<string, LineFacts> {
  const counted = new Map(allowance?.lines.map((line) => [line.id, line]))
  const counts = laneCounts(budget)
  const lanes = (line: string) =>
    LANE_FIELDS.flatMap((field) => {
      const count = counts.get(`${line}/${field}`)
      return count === undefined ? [] : [`own ${labelOf('lines', field)} in ${count} ${count === 1 ? 'lane' : 'lanes'}`]
    }).join(', ')
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
      number: position,
      db: inside ? inside.countedDb : (line?.loss.nominalDb ?? null),
      outside: !inside && Boolean(allowance?.from && allowance.to),
      basis: line?.basis ?? null,
      grade: line?.grade ?? 'nominal',
      owner: line?.owner ?? null,
      classTolerance: classTolerance(budget, row.line),
      lanes: lanes(row.line),
      problems: own.filter((flag) => flag.severity === 'problem').length,
      flags: own.length,
    })
  }
  return facts
}

function classTolerance(budget: Budget, id: string): string | null {
  const line = budget.lines[id]
  if (line?.model !== 'class' || line.lossClass === null) return null
  const lossClass = budget.lossClasses[line.lossClass]
  if (!lossClass || lossClass.removed || line.toleranceMinus !== null || line.tolerancePlus !== null) return null
  return showTolerance({ minus: lossClass.toleranceMinus, plus: lossClass.tolerancePlus }) || null
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
