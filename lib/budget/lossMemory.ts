import type { LineLoss } from './lineLoss'

/** Results kept: a link of 500 lines in 256 lanes has at most 128,000, most of them alike. */
const MOST = 50_000

/** Line's content → frequency and conditions → loss. */
const kept = new Map<string, Map<string, LineLoss>>()
let count = 0

/**
 * A line's loss, remembered by what it rests on, so that evaluating again after one change computes one line again.
 * @param content a name of what the line and what it rests on say
 * @param place a name of the frequency and of everything else that the loss depends on
 */
export function rememberedLoss(content: string, place: string, compute: () => LineLoss): LineLoss {
  const known = kept.get(content)?.get(place)
  if (known) return known
  if (count >= MOST) forgetLosses()
  const loss = compute()
  const ofContent = kept.get(content) ?? new Map<string, LineLoss>()
  kept.set(content, ofContent.set(place, loss))
  count++
  return loss
}

/** Forgets everything: for measuring, and for showing that remembering changes nothing. */
export function forgetLosses(): void {
  kept.clear()
  count = 0
}
