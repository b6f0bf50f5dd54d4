import type { LineLoss } from './lineLoss'

/** Results kept: a link of 500 lines in 256 lanes has at most 128,000, most of them alike. */
const MOST = 50_000

const kept = new Map<string, LineLoss>()

/**
 * A line's loss, remembered by what it rests on, so that evaluating again after one change computes one line again.
 * @param content a name of everything that the loss depends on
 */
export function rememberedLoss(content: string, compute: () => LineLoss): LineLoss {
  const known = kept.get(content)
  if (known) return known
  if (kept.size >= MOST) kept.clear()
  const loss = compute()
  kept.set(content, loss)
  return loss
}

/** Forgets everything: for measuring, and for showing that remembering changes nothing. */
export function forgetLosses(): void {
  kept.clear()
}
