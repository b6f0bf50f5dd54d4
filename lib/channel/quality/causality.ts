import type { Network } from '../networks/network'
import { graded, type Metric, ROTATION_THRESHOLDS } from './grade'

export type Causality = Metric & {
  /** The element that turns the wrong way most: receiving and driven port, counted from 1. */
  readonly ports: readonly [number, number]
}

/**
 * Does each element of S turn clockwise with frequency, as a response does that comes after its cause? IEEE Std 370-2020,
 * initial quality check: with V the steps between neighbouring points, R = Re Vₙ₊₁ Im Vₙ − Im Vₙ₊₁ Re Vₙ, the positive R in
 * percent of all |R|; the worst element counts.
 * It counts the sense of rotation and nothing else. It cannot see: a loss and a phase that do not belong together, as long as
 * the element turns clockwise; a response that comes early by less than the delay of the whole; steps so coarse that the delay
 * takes more than half a turn in one, which look like turning back. And the noise of a measurement with fine steps looks like
 * turning back although nothing is wrong: a measured line that reads 97 % in steps of 50 MHz reads 48 % in steps of 1 MHz.
 * @returns null where no element turns: fewer than three points, or straight paths only
 */
export function causality({ ports, hz, s }: Network): Causality | null {
  let worst: { percent: number; ports: readonly [number, number] } | null = null
  for (let i = 0; i < ports; i++) {
    for (let j = 0; j < ports; j++) {
      const percent = clockwise(s, 2 * (i * ports + j), 2 * ports * ports, hz.length)
      if (percent !== null && (!worst || percent < worst.percent)) worst = { percent, ports: [i + 1, j + 1] }
    }
  }
  return worst && { ...graded(worst.percent, ROTATION_THRESHOLDS), ports: worst.ports }
}

function clockwise(s: Float64Array, start: number, stride: number, count: number): number | null {
  let right = 0
  let all = 0
  for (let f = 2; f < count; f++) {
    const at = start + f * stride
    const beforeRe = (s[at - stride] as number) - (s[at - 2 * stride] as number)
    const beforeIm = (s[at - stride + 1] as number) - (s[at - 2 * stride + 1] as number)
    const afterRe = (s[at] as number) - (s[at - stride] as number)
    const afterIm = (s[at + 1] as number) - (s[at - stride + 1] as number)
    const turn = afterRe * beforeIm - afterIm * beforeRe
    if (turn > 0) right += turn
    all += Math.abs(turn)
  }
  return all > 0 ? (100 * right) / all : null
}
