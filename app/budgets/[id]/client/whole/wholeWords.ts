import type { Whole } from '../evaluation/whole'

/** Where the full evaluation stands; null: what is shown is of the budget as it is. */
export function wholeWords({ evaluation, working, failed }: Whole): string | null {
  const older = evaluation === null ? '' : ' What stands here is of an earlier state.'
  if (failed !== null) return `It could not be computed: ${failed}${/[.!?]$/.test(failed) ? '' : '.'}${older}`
  if (evaluation === null) return working ? 'Being computed.' : 'Not computed yet.'
  return working ? 'Being computed again after the last change; until then, this is the state before it.' : null
}
