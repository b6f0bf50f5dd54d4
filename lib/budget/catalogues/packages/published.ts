import type { PackageEntry } from './entry'

/** A package that comes with the program. */
export type PublishedPackage = PackageEntry & { readonly id: string }

const CONFIRM = 'From memory: confirm against the standard.'

const EARLY = { packageGamma0: '0', packageA1: '0.001734', packageA2: '0.0001455', packageTau: '0.006141' }
const ONE_SECTION = { secondImpedance: null, secondLength: null }

const bj = {
  ...EARLY,
  ...ONE_SECTION,
  impedance: '78.2 Ω',
  padCapacitance: '180 fF',
  dieCapacitance: '250 fF',
  clause: '802.3bj Annex 93A',
  caution: CONFIRM,
}
const cd = {
  ...EARLY,
  ...ONE_SECTION,
  impedance: '90 Ω',
  padCapacitance: '110 fF',
  dieCapacitance: '180 fF',
  clause: '802.3cd, first proposal of 2016',
  caution: `${CONFIRM} Impedance, capacitances and lengths were read in the proposal, the rest is remembered.`,
}
const ck = {
  packageGamma0: '0.0005',
  packageA1: '0.00089',
  packageA2: '0.0002',
  packageTau: '0.006141',
  impedance: '87.5 Ω',
  secondImpedance: '92.5 Ω',
  secondLength: '1.8 mm',
  padCapacitance: '87 fF',
  dieCapacitance: '120 fF',
  clause: '802.3ck',
  caution: `${CONFIRM} The inductance of 0.12 nH and the 30 fF between die and package are not in this entry.`,
}

const LENGTHS = { bj: ['12 mm', '30 mm'], cd: ['12 mm', '30 mm'], ck: ['12 mm', '31 mm'] } as const

/** The package sets of IEEE 802.3, each with its short and its long line. Offered, never chosen beforehand; from memory. */
export const PUBLISHED_PACKAGES: readonly PublishedPackage[] = Object.entries({ bj, cd, ck }).flatMap(([set, fields]) =>
  LENGTHS[set as keyof typeof LENGTHS].map((length) => ({
    ...fields,
    length,
    id: `${set}-${length.replace(' ', '')}`,
    name: `Package of 802.3${set}, ${length}`,
    body: 'IEEE 802.3',
    confidence: 'from-memory' as const,
  })),
)
