import { TWO_PORT } from '../networks/network'
import type { Propagation } from './propagation'

/**
 * The two-port of a uniform line in a real reference. With q = 1 − e^(−2γl) and D = 4ZR + (Z − R)²·q:
 * S11 = S22 = (Z² − R²)·q/D, S21 = S12 = 4ZR·e^(−γl)/D, which is ρ(1 − e^(−2γl))/(1 − ρ²e^(−2γl)) and its partner of the
 * textbooks (Pozar, Microwave Engineering, chapter 4) without the division by Z + R. q is formed by expm1 and sin², so that it
 * keeps its digits on a short line; nothing overflows on a lossy one; length 0 gives exactly 0 and 1.
 * @param line Np/m and rad/m of the attenuation and phase constants, Ω of the impedance, which may be complex but is finite
 * @param length m
 * @param reference Ω
 * @returns S11, S12, S21, S22, real and imaginary part side by side, 8 numbers a frequency
 */
export function lineTwoPort(
  line: Pick<Propagation, 'alpha' | 'beta' | 'zRe' | 'zIm'>,
  length: number,
  reference: number,
): Float64Array {
  const { alpha, beta, zRe, zIm } = line
  const count = alpha.length
  const s = new Float64Array(TWO_PORT * count)
  for (let i = 0; i < count; i++) {
    const loss = (alpha[i] as number) * length
    const phase = (beta[i] as number) * length
    const zr = zRe[i] as number
    const zi = zIm[i] as number
    const shrink = Math.exp(-loss)
    const sine = Math.sin(phase)
    const cosine = Math.cos(phase)
    const double = shrink * shrink
    // 1 − e^(−2γl)
    const qr = 2 * double * sine * sine - Math.expm1(-2 * loss)
    const qi = 2 * double * sine * cosine
    // Z² − R², (Z − R)² and 4ZR
    const square = zr * zr - zi * zi
    const cross = 2 * zr * zi
    const differs = (zr - reference) * (zr - reference) - zi * zi
    const differsIm = 2 * (zr - reference) * zi
    const through = 4 * reference * zr
    const throughIm = 4 * reference * zi
    const dr = through + differs * qr - differsIm * qi
    const di = throughIm + differs * qi + differsIm * qr
    const size = dr * dr + di * di
    const reflectedRe = (square - reference * reference) * qr - cross * qi
    const reflectedIm = (square - reference * reference) * qi + cross * qr
    const passedRe = shrink * (through * cosine + throughIm * sine)
    const passedIm = shrink * (throughIm * cosine - through * sine)
    const at = TWO_PORT * i
    s[at] = s[at + 6] = (reflectedRe * dr + reflectedIm * di) / size
    s[at + 1] = s[at + 7] = (reflectedIm * dr - reflectedRe * di) / size
    s[at + 2] = s[at + 4] = (passedRe * dr + passedIm * di) / size
    s[at + 3] = s[at + 5] = (passedIm * dr - passedRe * di) / size
  }
  return s
}
