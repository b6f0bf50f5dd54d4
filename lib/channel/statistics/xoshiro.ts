/** State of one stream of random numbers: four 32-bit words, never all zero. */
export type Stream = Int32Array

/**
 * The next word of xoshiro128** 1.1, a whole number from −2³¹ to 2³¹ − 1, equidistributed over a period of 2¹²⁸ − 1
 * (Blackman & Vigna, ACM Trans. Math. Softw. 47(4), 2021).
 */
export function nextWord(state: Stream): number {
  const second = state[1] as number
  const scaled = Math.imul(second, 5)
  const third = (state[2] as number) ^ (state[0] as number)
  const fourth = (state[3] as number) ^ second
  state[1] = second ^ third
  state[0] = (state[0] as number) ^ fourth
  state[2] = third ^ (second << 9)
  state[3] = (fourth << 11) | (fourth >>> 21)
  return Math.imul((scaled << 7) | (scaled >>> 25), 9)
}

/** A number between 0 and 1, never either. */
export function nextUnit(state: Stream): number {
  return ((nextWord(state) >>> 0) + 0.5) / 2 ** 32
}
