import type { Network } from '../networks/network'

/** The largest |S| of the file, where, and which element: receiving and driven port, counted from 1. */
export function largestElement({ ports, hz, s }: Network): {
  readonly value: number
  readonly hz: number
  readonly ports: readonly [number, number]
} {
  let worst = 0
  let largest = -1
  for (let at = 0; at < s.length; at += 2) {
    const square = (s[at] as number) ** 2 + (s[at + 1] as number) ** 2
    if (square > largest) {
      largest = square
      worst = at / 2
    }
  }
  const element = worst % (ports * ports)
  return {
    value: Math.sqrt(largest),
    hz: hz[Math.floor(worst / (ports * ports))] as number,
    ports: [Math.floor(element / ports) + 1, (element % ports) + 1],
  }
}
