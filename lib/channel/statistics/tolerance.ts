/** What a person means by ±. 'anywhere': a limit within which every value is as likely as any other. */
export type Meaning = 'limit' | '1-sigma' | '3-sigma' | '95-percent' | 'anywhere'

/** Coverage factor of 95 % for a normal distribution (JCGM 100:2008, table G.1). */
export const NORMAL_95 = 1.96

/**
 * Standard deviation of a tolerance t: t for 1σ, t/3 for 3σ and for a limit, t/1.96 for 95 %, t/√3 for anywhere within
 * (rectangular distribution, JCGM 100:2008, 4.3.7).
 */
export function sigmaOf(t: number, meaning: Meaning): number {
  if (meaning === '1-sigma') return t
  if (meaning === '95-percent') return t / NORMAL_95
  if (meaning === 'anywhere') return t / Math.sqrt(3)
  return t / 3
}

/** How far a single part may lie away: the limit itself, or three standard deviations where ± means less than that. */
export function extremeOf(t: number, meaning: Meaning): number {
  return meaning === 'anywhere' || meaning === 'limit' ? t : 3 * sigmaOf(t, meaning)
}
