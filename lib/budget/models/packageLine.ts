import { type PackageLine, packageAttenuation, packageTwoPort } from '../../channel/packages'
import { padCorner } from '../../channel/pads'
import { CAPACITANCE, LENGTH, NUMBER, RESISTANCE } from '../quantities'
import type { Model, ModelInput } from './model'
import { overPadCorner } from './pad'
import type { Piece, Values } from './piece'
import { type Bound, HIGHEST, holds } from './validity'

const unknown = Number.NaN

/** Common practice, no source: no package routes further, and no pair in one has an impedance far from these. */
export const PACKAGE_BOUNDS: readonly Bound[] = [
  {
    field: 'length',
    what: 'length in mm',
    figure: ({ length = unknown, secondLength = 0 }) => (length + secondLength) * 1e3,
    least: 0,
    most: 100,
  },
  { field: 'impedance', what: 'impedance in Ω', figure: ({ impedance = unknown }) => impedance, least: 40, most: 160 },
  {
    field: 'secondImpedance',
    what: "second section's impedance in Ω",
    figure: ({ secondImpedance = unknown }) => secondImpedance,
    least: 40,
    most: 160,
  },
  {
    // Air at least, and no laminate slower than a permittivity of 16: 1/c to 4/c.
    field: 'packageTau',
    what: 'delay τ in ns/mm',
    figure: ({ packageTau = unknown }) => packageTau * 1e6,
    least: 3.3356e-3,
    most: 13.343e-3,
  },
  {
    field: 'padCapacitance',
    what: 'frequency over that at which the ball takes half of the power',
    figure: (values) => overPadCorner(values.padCapacitance, values),
    least: 0,
    most: 1,
  },
]

/**
 * A package's line in the form of IEEE 802.3 Annex 93A (the form from memory, its parameters typed by the person): one section or two and
 * the capacitance at the ball. It counts Re(γ)·length; reflections and the ball show in the cascade.
 */
export const packageLine: Model = (input) => {
  const { fields, line, reference } = input
  const parameters = parametersOf(input)
  const length = fields.need('length', LENGTH)
  const impedance = fields.need('impedance', RESISTANCE)
  const padCapacitance = fields.need('padCapacitance', CAPACITANCE)
  const second = secondSection(input)
  if (parameters === null || length === null || impedance === null || padCapacitance === null || second === null)
    return null
  const values = { ...parameters, length, impedance, padCapacitance, ...second }
  if (!holds(input, PACKAGE_BOUNDS, values)) return null
  return { values, build: (changed) => pieceOf(packageOf(changed, line.mirrored === true), reference) }
}

/** The standard's units to SI: 1/mm, √ns/mm, ns/mm, ns/mm. */
const UNITS = {
  packageGamma0: 1e3,
  packageA1: Math.sqrt(1e-9) * 1e3,
  packageA2: 1e-6,
  packageTau: 1e-6,
} as const

function parametersOf({ fields }: ModelInput): Values | null {
  const found: Record<string, number> = {}
  let complete = true
  for (const [field, unit] of Object.entries(UNITS) as [keyof typeof UNITS, number][]) {
    const value = fields.need(field, NUMBER)
    if (value === null) complete = false
    else if (value < 0) {
      fields.say(
        'outside-validity',
        field,
        `${fields.name}: a parameter of its loss is below zero.`,
        'Check the sign and the number.',
      )
      complete = false
    } else found[field] = value * unit
  }
  return complete ? found : null
}

/** Both of the second section's fields, or neither. */
function secondSection({ fields, line }: ModelInput): Values | null {
  if (line.secondLength === null && line.secondImpedance === null) return {}
  const secondLength = fields.need('secondLength', LENGTH)
  const secondImpedance = fields.need('secondImpedance', RESISTANCE)
  return secondLength === null || secondImpedance === null ? null : { secondLength, secondImpedance }
}

function packageOf(values: Values, mirrored: boolean): PackageLine {
  const value = (field: string) => values[field] ?? unknown
  const first = { length: value('length'), impedance: value('impedance') }
  const second = { length: value('secondLength'), impedance: value('secondImpedance') }
  return {
    parameters: {
      gamma0: value('packageGamma0'),
      a1: value('packageA1'),
      a2: value('packageA2'),
      tau: value('packageTau'),
    },
    sections: values.secondLength === undefined ? [first] : [first, second],
    ballCapacitance: value('padCapacitance'),
    mirrored,
  }
}

function pieceOf(line: PackageLine, reference: number | null): Piece {
  return {
    from: 0,
    to: reference === null ? HIGHEST : Math.min(HIGHEST, padCorner(line.ballCapacitance, reference)),
    reflects: true,
    twoPort: (hz, ohms) => packageTwoPort(line, hz, ohms),
    attenuation: (hz) => packageAttenuation(line, hz),
    uncertainty: 0,
  }
}
