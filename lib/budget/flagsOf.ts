import { CHECKS, type Checked } from './checks'
import type { Flag } from './evaluation'
import { FLAGS, type FlagDraft, flagOf } from './flags'

const SEVERITIES = ['problem', 'warning', 'notice'] as const

/** A flag that a line raised, and the lane that it was looked at in; null: as it stands for all lanes. */
export type LineDraft = { readonly draft: FlagDraft; readonly lane: number | null }

/** All flags of an evaluation, each said once, problems first. */
export function flagsOf(checked: Checked, lineDrafts: readonly LineDraft[]): Flag[] {
  const { context, judged } = checked
  const inSums: LineDraft[] = []
  for (const { lanes } of judged)
    for (const { lines } of lanes)
      for (const { item, loss } of lines) for (const draft of loss.drafts) inSums.push({ draft, lane: item.lane })
  const drafts = [
    ...context.signalling.drafts,
    ...acrossLanes([...lineDrafts, ...inSums]),
    ...context.lanes.drafts,
    ...CHECKS.flatMap((check) => [...check(checked)]),
  ]
  return drafts.map(flagOf).sort((a, b) => rank(a) - rank(b))
}

/** Said once for a line, and once more for all lanes in which something else is wrong than in the line itself. */
function acrossLanes(drafts: readonly LineDraft[]): FlagDraft[] {
  const own = new Map<string, FlagDraft>()
  const inLanes = new Map<string, { readonly draft: FlagDraft; readonly lanes: Set<number> }>()
  for (const { draft, lane } of drafts) {
    if (lane === null) own.set(`${keyOf(draft)}\n${draft.message}`, draft)
  }
  for (const { draft, lane } of drafts) {
    if (lane === null || own.has(`${keyOf(draft)}\n${draft.message}`)) continue
    const known = inLanes.get(keyOf(draft)) ?? { draft, lanes: new Set<number>() }
    known.lanes.add(lane)
    inLanes.set(keyOf(draft), known)
  }
  const ofLanes = [...inLanes.values()].map(({ draft, lanes }) => ({
    ...draft,
    message: `${draft.message} (${laneWords([...lanes].sort((a, b) => a - b))})`,
  }))
  return [...own.values(), ...ofLanes]
}

function keyOf({ code, section, id, field }: FlagDraft): string {
  return `${code}\n${section}\n${id}\n${field}`
}

/** Lanes named before the rest is counted. */
const NAMED = 4

function laneWords(lanes: readonly number[]): string {
  if (lanes.length === 1) return `lane ${lanes[0]}`
  const named = lanes.slice(0, NAMED).join(', ')
  return lanes.length > NAMED ? `lanes ${named} and ${lanes.length - NAMED} more` : `lanes ${named}`
}

function rank({ code }: Flag): number {
  return SEVERITIES.indexOf(FLAGS[code][0])
}
