import type { Judged } from './allowance/judge'
import type { Context } from './context'
import type { Flag } from './evaluation'
import { FLAGS, type FlagDraft, flagOf } from './flags'

const SEVERITIES = ['problem', 'warning', 'notice'] as const

/** All flags of an evaluation, each said once, problems first. */
export function flagsOf(context: Context, judged: readonly Judged[], lineDrafts: readonly FlagDraft[]): Flag[] {
  const drafts = [
    ...context.signalling.drafts,
    ...lineDrafts,
    ...judged.flatMap(({ lanes }) => lanes.flatMap(({ lines }) => lines.flatMap(({ loss }) => loss.drafts))),
    ...context.lanes.drafts,
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
