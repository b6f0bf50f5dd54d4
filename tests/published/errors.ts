import type { Network } from '../../lib/channel/networks'

/** The worst of what a two-port differs from the true one by, up to a frequency. */
export function worstErrors(found: Network, truth: Network, toHz: number) {
  let db = 0
  let degrees = 0
  let reflection = 0
  for (const [f, hz] of truth.hz.entries()) {
    if (hz > toHz) break
    const [fr = 0, fi = 0] = found.s.subarray(8 * f + 4)
    const [tr = 0, ti = 0] = truth.s.subarray(8 * f + 4)
    db = Math.max(db, Math.abs(20 * Math.log10(Math.hypot(fr, fi) / Math.hypot(tr, ti))))
    degrees = Math.max(degrees, Math.abs((Math.atan2(fi * tr - fr * ti, fr * tr + fi * ti) * 180) / Math.PI))
    for (const at of [8 * f, 8 * f + 6]) {
      const re = (found.s[at] ?? 0) - (truth.s[at] ?? 0)
      const im = (found.s[at + 1] ?? 0) - (truth.s[at + 1] ?? 0)
      reflection = Math.max(reflection, Math.hypot(re, im))
    }
  }
  return { db, degrees, reflection }
}
