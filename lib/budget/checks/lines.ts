import { contentName } from '../contentName'
import type { FlagDraft } from '../flags'
import type { LineItem } from '../lineItem'
import type { Beside, Check, LineCheck } from './check'
import { claims } from './claims'
import { type EvidenceRecord, evidenceIdOf, evidenceOf } from './evidence'
import { laminates } from './laminates'
import { otherConditions } from './otherConditions'
import { proof } from './proof'
import { unusualLoss } from './unusualLoss'

const LINE_CHECKS: readonly LineCheck[] = [claims, otherConditions, proof, laminates, unusualLoss]

type Remembered = {
  /** A name of what the file that proves it says. */
  readonly file: string
  readonly nominal: number | null
  readonly link: Link
  readonly drafts: readonly FlagDraft[]
}

/** Lines kept; more than a worksheet has, for several worksheets. */
const MOST = 20_000

/** Line's content → what was found of it, and beside what. */
const kept = new Map<string, Remembered>()

/** What is checked of each line by itself; remembered, so that after one change one line is looked at again. */
export const lines: Check = ({ context, lines: evaluations }) => {
  const { budget, losses, signalling, items } = context
  const found: FlagDraft[] = []
  const link = {
    nyquist: signalling.evaluation.nyquist,
    reference: losses.reference,
    referenceTemperature: losses.referenceTemperature,
  }
  for (const item of items) {
    const evidence = evidenceOf(budget, item)
    const nominal = evaluations.get(item.id)?.loss.nominalDb ?? null
    const file = evidence === null ? '' : contentName('evidence', evidenceIdOf(item) ?? '', evidence)
    for (const draft of remembered(item, file, nominal, link, evidence)) found.push(draft)
  }
  return found
}

/** What is the same for all lines. */
type Link = Omit<Beside, 'nominal' | 'evidence'>

function remembered(
  item: LineItem,
  file: string,
  nominal: number | null,
  link: Link,
  evidence: EvidenceRecord | null,
): readonly FlagDraft[] {
  const known = kept.get(item.content)
  if (known && known.file === file && known.nominal === nominal && same(known.link, link)) return known.drafts
  if (kept.size >= MOST) kept.clear()
  const drafts = LINE_CHECKS.flatMap((check) => [...check(item, { ...link, nominal, evidence })])
  kept.set(item.content, { file, nominal, link, drafts })
  return drafts
}

function same(a: Link, b: Link): boolean {
  return a.nyquist === b.nyquist && a.reference === b.reference && a.referenceTemperature === b.referenceTemperature
}
