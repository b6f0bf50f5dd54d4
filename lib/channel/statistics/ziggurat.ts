import { nextUnit, nextWord, type Stream } from './xoshiro'

const LAYERS = 256
/** Right edge of the lowest layer and area of every layer (Marsaglia & Tsang, J. Stat. Softw. 5(8), 2000, for 256 layers). */
const EDGE = 3.6541528853610088
const AREA = 0.00492867323397466
/** 24 bits of a word choose the place in a layer and the 8 lowest the layer: apart, as Doornik (2005) asks. */
const PLACES = 2 ** 23

const density = (x: number) => Math.exp(-0.5 * x * x)

/** Right edge of each layer, from the widened lowest one up to 0 at the top. */
const EDGES = new Float64Array(LAYERS + 1)
/** Width of a place in each layer, and how many places lie wholly under the curve. */
const WIDTH = new Float64Array(LAYERS)
const SURE = new Int32Array(LAYERS)
EDGES[0] = AREA / density(EDGE)
EDGES[1] = EDGE
for (let layer = 1; layer < LAYERS - 1; layer++) {
  const edge = EDGES[layer] as number
  EDGES[layer + 1] = Math.sqrt(-2 * Math.log(density(edge) + AREA / edge))
}
for (let layer = 0; layer < LAYERS; layer++) {
  const edge = EDGES[layer] as number
  WIDTH[layer] = edge / PLACES
  SURE[layer] = Math.floor(((EDGES[layer + 1] as number) / edge) * PLACES)
}

/**
 * Fills with normal deviates of mean 0 and standard deviation 1, unbounded, by the ziggurat method. Values lie on a grid of
 * at most 4.7e-7, the tail beyond 3.65 on a finer one. However many are filled at once, a stream gives the same row of them.
 */
export function fillNormal(stream: Stream, out: Float64Array): void {
  // nextWord() written out: with the state in local variables the loop is three times as fast.
  let a = stream[0] as number
  let b = stream[1] as number
  let c = stream[2] as number
  let d = stream[3] as number
  for (let n = 0; n < out.length; n++) {
    const scaled = Math.imul(b, 5)
    const word = Math.imul((scaled << 7) | (scaled >>> 25), 9)
    const shifted = b << 9
    c ^= a
    d ^= b
    b ^= c
    a ^= d
    c ^= shifted
    d = (d << 11) | (d >>> 21)
    const x = abscissa(word)
    if (isSure(word)) {
      out[n] = x
      continue
    }
    stream[0] = a
    stream[1] = b
    stream[2] = c
    stream[3] = d
    out[n] = atTheRim(stream, word & 0xff, x)
    a = stream[0] as number
    b = stream[1] as number
    c = stream[2] as number
    d = stream[3] as number
  }
  stream[0] = a
  stream[1] = b
  stream[2] = c
  stream[3] = d
}

/** The middle of the place, from −2²³ to 2²³ − 1, that a word chooses in its layer, so that neither side is larger. */
function abscissa(word: number): number {
  return ((word >> 8) + 0.5) * (WIDTH[word & 0xff] as number)
}

/** Whether the layer is wholly under the curve at a word's place; places n and −1 − n lie alike. */
function isSure(word: number): boolean {
  return ((word >> 8) ^ (word >> 31)) < (SURE[word & 0xff] as number)
}

/** Where the layer is not wholly under the curve: kept if a height drawn in the layer is under it, else drawn anew. */
function atTheRim(stream: Stream, firstLayer: number, firstX: number): number {
  let layer = firstLayer
  let x = firstX
  for (;;) {
    if (layer === 0) return x < 0 ? -tail(stream) : tail(stream)
    const low = density(EDGES[layer] as number)
    const high = density(EDGES[layer + 1] as number)
    if (low + nextUnit(stream) * (high - low) < density(x)) return x
    const word = nextWord(stream)
    layer = word & 0xff
    x = abscissa(word)
    if (isSure(word)) return x
  }
}

/** A deviate beyond the edge: an exponential that lies above the curve there, thinned (Marsaglia 1964). */
function tail(stream: Stream): number {
  for (;;) {
    const x = -Math.log(nextUnit(stream)) / EDGE
    const y = -Math.log(nextUnit(stream))
    if (2 * y > x * x) return EDGE + x
  }
}
