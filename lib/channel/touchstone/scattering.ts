import { MIXTURE, mixPorts } from '../networks/portwise'
import type { Parameter } from './file'

/** Which ports a matrix takes by their voltage; it takes the others by their current, and gives the other of the two. */
const BY_VOLTAGE: Readonly<Record<Exclude<Parameter, 'S'>, (port: number) => boolean>> = {
  Z: () => false,
  Y: () => true,
  H: (port) => port === 1,
  G: (port) => port === 0,
}

/**
 * S-parameters of Z-, Y-, H- or G-parameters: a = (v + R·i)/2√R and b = (v − R·i)/2√R at each port (Kurokawa 1965 at real R). As
 * H and G only exchange v and i at a port, the conversion is the same for all four.
 * @param given [frequency][row][column]; Ω, S and ratios, or normalised, that is at R = 1 of each port
 * @param resistances R of each port
 * @returns see {@link mixPorts}
 */
export function scattering(
  parameter: Exclude<Parameter, 'S'>,
  given: Float64Array,
  resistances: Float64Array,
): { matrices: Float64Array; without: number } {
  const mixtures = new Float64Array(MIXTURE * resistances.length)
  for (let port = 0; port < resistances.length; port++) {
    const ofCurrent = Math.sqrt(resistances[port] as number) / 2
    const ofVoltage = 1 / (4 * ofCurrent)
    const byVoltage = BY_VOLTAGE[parameter](port)
    const mixture = byVoltage
      ? [ofVoltage, 0, ofCurrent, 0, ofVoltage, 0, -ofCurrent, 0]
      : [ofCurrent, 0, ofVoltage, 0, -ofCurrent, 0, ofVoltage, 0]
    mixtures.set(mixture, MIXTURE * port)
  }
  return mixPorts(given, resistances.length, mixtures)
}
