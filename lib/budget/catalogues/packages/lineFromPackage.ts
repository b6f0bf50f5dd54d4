import type { Line } from '../../schema'
import type { PackageEntry } from './entry'

/** The fields of a package's line that an entry fills. The capacitance of the die's pad is a line of its own. */
export function lineFromPackage(entry: PackageEntry): Partial<Line> {
  const { packageGamma0, packageA1, packageA2, packageTau } = entry
  const { impedance, length, secondImpedance, secondLength, padCapacitance } = entry
  const parameters = { packageGamma0, packageA1, packageA2, packageTau }
  return { ...parameters, model: 'package-line', impedance, length, secondImpedance, secondLength, padCapacitance }
}
