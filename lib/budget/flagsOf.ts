import { CHECKS, type Checked } from './checks'
import type { Flag } from './evaluation'
import { FLAGS, type FlagDraft, flagOf } from './flags'

const SEVERITIES = ['problem', 'warning', 'notice'] as const

/** All flags of an evaluation, each said once, problems first. */
export function flagsOf(checked: Checked, lineDrafts: readonly FlagDraft[]): Flag[] {
  const { context, judged } = checked
  const drafts = [
    ...context.signalling.drafts,
    ...lineDrafts,
    ...judged.flatMap(({ lanes }) => lanes.flatMap(({ lines }) => lines.flatMap(({ loss }) => loss.drafts))),
    ...context.lanes.drafts,
    ...CHECKS.flatMap((check) => [...check(checked)]),
  ]
  const once = new Map<string, FlagDraft>()
  for (const draft of drafts) {
    const key = `${draft.code}\n${draft.section}\n${draft.id}\n${draft.field}\n${draft.message}`
    if (!once.has(key)) once.set(key, draft)
  }
  return [...once.values()].map(flagOf).sort((a, b) => rank(a) - rank(b))
}

function rank({ code }: Flag): number {
  return SEVERITIES.indexOf(FLAGS[code][0])
}
