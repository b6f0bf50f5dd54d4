import type { BuildLine } from '../../../lib/budget/builds'
import type { Computed, Piece, Values } from '../../../lib/budget/models/piece'

/** A line of 2 dB ±0.3 dB, a limit, that varies on its own in a single lane. */
export function buildLine(id: string, rest: Partial<BuildLine> = {}): BuildLine {
  return {
    id,
    group: id,
    sign: 1,
    nominalDb: 2,
    minusDb: 0.3,
    plusDb: 0.3,
    meaning: 'limit',
    spreadDb: 0,
    response: null,
    lanes: new Map(),
    ...rest,
  }
}

/** A model whose attenuation is a formula of its values, whatever the reference. */
export function formula(values: Values, db: (values: Values, hz: number) => number): Computed {
  return { values, build: (changed) => attenuating((hz) => db(changed, hz)) }
}

function attenuating(db: (hz: number) => number): Piece {
  return {
    from: 0,
    to: 1e11,
    reflects: false,
    twoPort: (hz) => new Float64Array(8 * hz.length),
    attenuation: (hz) => hz.map(db),
    uncertainty: 0,
  }
}
