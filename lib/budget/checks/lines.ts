import { contentName } from '../contentName'
import type { FlagDraft } from '../flags'
import type { LineItem } from '../lineItem'
import type { Beside, Check, LineCheck } from './check'
import { claims } from './claims'
import { evidenceIdOf, evidenceOf } from './evidence'
import { laminates } from './laminates'
import { otherConditions } from './otherConditions'
import { proof } from './proof'
import { unusualLoss } from './unusualLoss'

const LINE_CHECKS: readonly LineCheck[] = [claims, otherConditions, proof, laminates, unusualLoss]

type Remembered = Beside & { readonly file: string; readonly drafts: readonly FlagDraft[] }

/** Lines kept; more than a worksheet has, for several worksheets. */
const MOST = 20_000

/** Line's content → what was found of it, and beside what. */
const kept = new Map<string, Remembered>()

/** What is checked of each line by itself; remembered, so that after one change one line is looked at again. */
export const lines: Check = ({ context, lines: evaluations }) => {
  const { budget, losses, signalling, items } = context
  const found: FlagDraft[] = []
  for (const item of items) {
    const evidence = evidenceOf(budget, item)
    const beside: Beside = {
      nominal: evaluations.get(item.id)?.loss.nominalDb ?? null,
      nyquist: signalling.evaluation.nyquist,
      reference: losses.reference,
      referenceTemperature: losses.referenceTemperature,
      evidence,
    }
    const file = evidence === null ? '' : contentName('evidence', evidenceIdOf(item) ?? '', evidence)
    for (const draft of remembered(item, beside, file)) found.push(draft)
  }
  return found
}

function remembered(item: LineItem, beside: Beside, file: string): readonly FlagDraft[] {
  const known = kept.get(item.content)
  if (known && known.file === file && same(known, beside)) return known.drafts
  if (kept.size >= MOST) kept.clear()
  const drafts = LINE_CHECKS.flatMap((check) => [...check(item, beside)])
  kept.set(item.content, { ...beside, file, drafts })
  return drafts
}

function same(a: Beside, b: Beside): boolean {
  return (
    a.nominal === b.nominal &&
    a.nyquist === b.nyquist &&
    a.reference === b.reference &&
    a.referenceTemperature === b.referenceTemperature
  )
}
