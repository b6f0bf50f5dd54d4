/**
 * What of the signal lies at which frequency, to stand behind a loss curve. Times in s, frequencies in Hz.
 */

/** A periodic trapezoid: `width` at half its height, both edges `edge` from 0 to 100 %. */
export type Trapezoid = {
  readonly amplitude: number
  readonly period: number
  readonly width: number
  readonly edge: number
}

/**
 * One-sided amplitudes |c_n| = 2A (τ/T) |sinc(nτ/T)| |sinc(n·tr/T)| of the harmonics n = 1 to count, sinc x = sin(πx)/(πx).
 * From memory (C. Paul, Introduction to Electromagnetic Compatibility, spectra of digital waveforms).
 * @returns in the unit of the amplitude; the n-th harmonic, at n/period, stands at index n − 1
 */
export function trapezoidHarmonics({ amplitude, period, width, edge }: Trapezoid, count: number): Float64Array {
  const harmonics = new Float64Array(count)
  const duty = width / period
  for (let n = 1; n <= count; n++)
    harmonics[n - 1] = 2 * amplitude * duty * Math.abs(sinc(n * duty) * sinc((n * edge) / period))
  return harmonics
}

/** Corners of the trapezoid's envelope: from 1/(πτ) it falls by 20 dB, from 1/(π·tr) by 40 dB a decade. From memory (Paul, as above). */
export function trapezoidCorners({ width, edge }: Trapezoid): readonly [number, number] {
  return [1 / (Math.PI * width), 1 / (Math.PI * edge)]
}

/**
 * The knee of an edge. '10-90' and '20-80': where a single pole of that rise time has fallen by 3 dB, ln 9/(2π) = 0.350 and
 * ln 4/(2π) = 0.221 over the rise time (exact). 'rule': 0.5 over the rise time from 10 to 90 %, a common rule of thumb.
 */
export function kneeFrequency(riseTime: number, by: '10-90' | '20-80' | 'rule'): number {
  const times = by === 'rule' ? 0.5 : Math.log(by === '10-90' ? 9 : 4) / (2 * Math.PI)
  return times / riseTime
}

/**
 * Mean power of equally likely, equally spaced levels from −1 to 1: (L² − 1)/(3(L − 1)²); 1 of two levels, 5/9 of four. The
 * shape of the spectrum is the same for every number of levels.
 */
export function levelPower(levels: number): number {
  return (levels * levels - 1) / (3 * (levels - 1) ** 2)
}

export type Spectrum = {
  /** Power density over its value at 0 Hz, 0 to 1. */
  readonly density: Float64Array
  /** Share of the whole power that lies below the frequency, 0 to 1. */
  readonly below: Float64Array
}

/**
 * The spectrum of random symbols of equal chance, one after the other without correlation: sinc²(f·Ts) of the held symbol times
 * sinc²(f·tr) of straight edges (the pulse is convolved with a box of the edge's length). Below 0.5 of the symbol rate lie 0.7737
 * of the power without edges, whatever the number of levels. The share is integrated by 8-point Gauss-Legendre over at most half
 * a lobe (error under 1e-13) and held against the whole power, 1 − tr/(3Ts), which is exact for edges up to one symbol.
 * @param signal symbolRate in Bd; edge 0 to 100 % in s, from 0 to one symbol
 * @param hz Hz, rising, from 0 on
 * @throws RangeError for other edges, or frequencies that do not rise
 */
export function spectrumOf(
  { symbolRate, edge }: { readonly symbolRate: number; readonly edge: number },
  hz: Float64Array,
): Spectrum {
  const share = edge * symbolRate
  if (!(share >= 0 && share <= 1))
    throw new RangeError(`An edge of ${share} symbols; it lies between 0 and one symbol.`)
  const density = new Float64Array(hz.length)
  const below = new Float64Array(hz.length)
  let from = 0
  let sum = 0
  for (let i = 0; i < hz.length; i++) {
    const to = (hz[i] as number) / symbolRate
    if (!(to >= from)) throw new RangeError('The frequencies of a spectrum rise from 0 on.')
    sum += integral(from, to, share)
    density[i] = densityAt(to, share)
    below[i] = (2 * sum) / (1 - share / 3)
    from = to
  }
  return { density, below }
}

/** @param turns frequency over symbol rate */
function densityAt(turns: number, share: number): number {
  return (sinc(turns) * sinc(turns * share)) ** 2
}

/** Gauss-Legendre, 8 points on −1 to 1: the positive nodes and their weights (Abramowitz and Stegun, table 25.4). */
const NODES = [0.1834346424956498, 0.525532409916329, 0.7966664774136267, 0.9602898564975363] as const
const WEIGHTS = [0.362683783378362, 0.3137066458778873, 0.2223810344533745, 0.1012285362903763] as const

function integral(from: number, to: number, share: number): number {
  const panels = Math.ceil((to - from) * 2)
  const half = (to - from) / panels / 2
  let sum = 0
  for (let panel = 0; panel < panels; panel++) {
    const middle = from + half * (2 * panel + 1)
    for (let k = 0; k < NODES.length; k++) {
      const away = half * (NODES[k] as number)
      sum += (WEIGHTS[k] as number) * (densityAt(middle - away, share) + densityAt(middle + away, share))
    }
  }
  return sum * (panels === 0 ? 0 : half)
}

function sinc(x: number): number {
  return x === 0 ? 1 : Math.sin(Math.PI * x) / (Math.PI * x)
}
