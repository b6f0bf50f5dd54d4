import { RECORD_WORDS } from '../../../../../lib/budget/record'
import type { Budget, SectionName, Verdict } from '../../../../../lib/budget/schema'
import type { Change } from '../../../../../lib/sheet/change'
import type { Effect, TrailEntry } from '../../../../../lib/sheet/wire'
import { signedDecibels } from '../../../../words/decibels'
import { VERDICT_WORD } from '../../../../words/terms'
import { labelOf } from '../words/labels'
import { recordName, sayValue } from '../words/say'

/** One thing that an entry did, in words: whose field, and from what to what. */
export type Deed = {
  readonly key: string
  readonly section: Change['section']
  readonly id: string | null
  /** The record's name as it is called now. */
  readonly subject: string
  readonly what: string
}

/** What an entry did, one deed per changed field; a new record is one deed, whatever it came with. */
export function deedsOf(entry: Pick<TrailEntry, 'changes' | 'kind'>, budget: Budget): readonly Deed[] {
  if (entry.kind === 'seed') {
    return [{ key: 'seed', section: 'head', id: null, subject: budget.head.name ?? 'the budget', what: 'made' }]
  }
  const deeds = new Map<string, Deed>()
  for (const change of entry.changes) {
    const record = `${change.section}/${change.id ?? ''}`
    const key = change.kind === 'add' ? `${record}/added` : `${record}/${change.field}`
    const section: 'head' | SectionName = change.section === 'laneValues' ? 'lines' : change.section
    if (deeds.has(key)) continue
    deeds.set(key, {
      key,
      section: change.section,
      id: change.id,
      subject: recordName(budget, section, change.id),
      what: change.kind === 'add' ? `new ${RECORD_WORDS[section]}` : whatOf(change, budget),
    })
  }
  return [...deeds.values()]
}

function whatOf(change: Change, budget: Budget): string {
  const say = (value: Change['before']) => sayValue(budget, change.section, change.field, value) || 'nothing'
  const field = labelOf(change.section, change.field)
  if (change.kind === 'overtaken') {
    return `${field}: ${say(change.written ?? null)} arrived late, ${say(change.after)} stands`
  }
  if (change.field === 'removed') return change.after === true ? 'taken out' : 'put back'
  if (change.field === 'order') return 'moved'
  if (change.kind === 'text') return change.after === '' ? `${field} emptied` : `${field} written`
  return `${field} ${say(change.before)} → ${say(change.after)}${change.unseen ? ', without having seen the first' : ''}`
}

export type EffectWords = {
  readonly allowance: string
  readonly figure: string
  /** Towards the ground, away from it, or neither. */
  readonly sign: 'worse' | 'better' | 'same'
  readonly said: string
}

/** What an entry did to each margin; of an undecided allowance, to what is known of its loss. */
export function effectWords(effect: Effect): EffectWords | null {
  const { before, after, allowance, name } = effect
  if (!after) return before ? words(allowance, 'gone', 'same', `${name} is no longer judged`) : null
  const verdict = verdictWords(before?.verdict, after.verdict)
  if (before?.marginDb != null && after.marginDb !== null) {
    const change = after.marginDb - before.marginDb
    if (Math.abs(change) < 0.005 && before.verdict === after.verdict) return null
    return words(allowance, signedDecibels(change), signOf(change), `margin of ${name}${verdict}`)
  }
  if (after.marginDb !== null) {
    return words(allowance, after.marginDb.toFixed(2).replace('-', '−'), 'same', `first margin of ${name}${verdict}`)
  }
  const known = (after.knownDb ?? 0) - (before?.knownDb ?? 0)
  if (Math.abs(known) < 0.005 && before?.verdict === after.verdict) return null
  return words(allowance, signedDecibels(known), signOf(-known), `known loss of ${name}, no margin yet${verdict}`)
}

const words = (allowance: string, figure: string, sign: EffectWords['sign'], said: string): EffectWords => ({
  allowance,
  figure,
  sign,
  said,
})

const signOf = (change: number) => (Math.abs(change) < 0.005 ? 'same' : change > 0 ? 'better' : 'worse')

function verdictWords(before: string | undefined, after: string): string {
  if (before === undefined || before === after) return ''
  return `, ${VERDICT_WORD[before as Verdict].toLowerCase()} → ${VERDICT_WORD[after as Verdict].toLowerCase()}`
}

/** Whether an entry touched this record. */
export function touches(entry: Pick<TrailEntry, 'changes'>, section: SectionName, id: string): boolean {
  return entry.changes.some(
    (change) =>
      change.id === id && (change.section === section || (section === 'lines' && change.section === 'laneValues')),
  )
}
