import type { Stream } from './xoshiro'

const BITS_64 = (1n << 64n) - 1n

/** 64-bit FNV-1a of a text's UTF-8 bytes (Fowler, Noll & Vo). */
export function fnv1a(text: string): bigint {
  let hash = 0xcbf29ce484222325n
  for (const byte of new TextEncoder().encode(text)) hash = ((hash ^ BigInt(byte)) * 0x100000001b3n) & BITS_64
  return hash
}

/** The first n outputs of SplitMix64 (Steele, Lea & Flood, OOPSLA 2014; Vigna's splitmix64.c). */
export function splitMix64(seed: bigint, n: number): bigint[] {
  return Array.from({ length: n }, (_, k) => {
    let z = (seed + 0x9e3779b97f4a7c15n * BigInt(k + 1)) & BITS_64
    z = ((z ^ (z >> 30n)) * 0xbf58476d1ce4e5b9n) & BITS_64
    z = ((z ^ (z >> 27n)) * 0x94d049bb133111ebn) & BITS_64
    return z ^ (z >> 31n)
  })
}

/**
 * A stream of its own for each seed and name: the same two always give the same numbers, whatever else is drawn beside it.
 * FNV-1a of 'seed/name' seeds SplitMix64, whose first 128 bits are the state of xoshiro128**; two streams of one run overlap
 * with a chance of about 2⁻⁶⁴ for each pair.
 */
export function streamOf(seed: number, name: string): Stream {
  const words = splitMix64(fnv1a(`${seed}/${name}`), 2)
  const state = Int32Array.from(
    words.flatMap((word) => [Number(BigInt.asIntN(32, word)), Number(BigInt.asIntN(32, word >> 32n))]),
  )
  // The all-zero state would stay zero for ever.
  if (state.every((word) => word === 0)) state[0] = 1
  return state
}
