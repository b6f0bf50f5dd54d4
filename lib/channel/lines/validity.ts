import type { Dimensions } from './crossSection'
import type { Structure } from './structures'

/** A ratio that the formulas of a cross-section hold between; null: no bound on that side. */
export type Bound = {
  /** As messages name it. */
  readonly name: string
  readonly of: (dimensions: Dimensions, dielectric: number) => number
  readonly from: number | null
  readonly to: number | null
  /** The dimension that is looked at first where it is outside. */
  readonly look: keyof Dimensions | 'dielectric'
}

const spacing = ({ thickness, below, above }: Dimensions) => below + thickness + above

const widthOverHeight = (from: number, to: number): Bound => ({
  name: 'width over height',
  of: ({ width, below }) => width / below,
  from,
  to,
  look: 'width',
})
const thicknessOverHeight: Bound = {
  name: 'copper thickness over height',
  of: ({ thickness, below }) => thickness / below,
  from: 0.001,
  to: 0.3,
  look: 'thickness',
}
const thicknessOverWidth: Bound = {
  name: 'copper thickness over width',
  of: ({ thickness, width }) => thickness / width,
  from: null,
  to: 0.6,
  look: 'thickness',
}
const thicknessOverGap: Bound = {
  name: 'copper thickness over gap',
  of: ({ thickness, gap }) => thickness / gap,
  from: null,
  to: 1,
  look: 'gap',
}
const permittivity = (to: number): Bound => ({
  name: 'relative permittivity',
  of: (_, dielectric) => dielectric,
  from: 1,
  to,
  look: 'dielectric',
})
const thicknessOverSpacing: Bound = {
  name: 'copper thickness over plane to plane',
  of: (dimensions) => dimensions.thickness / spacing(dimensions),
  from: 0.001,
  to: 0.25,
  look: 'thickness',
}
const heightOverHeight: Bound = {
  name: 'larger over smaller height',
  of: ({ below, above }) => Math.max(below, above) / Math.min(below, above),
  from: null,
  to: 4,
  look: 'above',
}

/**
 * Where each cross-section holds. Microstrip: Hammerstad and Jensen 1980 and Kirschning and Jansen 1982; pairs of them Kirschning and
 * Jansen 1984 (ranges from memory). Stripline: Wheeler 1978 (w′ up to 10, from memory). Thickness, the gap of striplines and
 * the ratio of their heights: as far as our own comparison with boundary elements reaches (tests/published/figures).
 */
export const BOUNDS: Readonly<Record<Structure, readonly Bound[]>> = {
  microstrip: [widthOverHeight(0.1, 100), thicknessOverHeight, thicknessOverWidth, permittivity(20)],
  'coupled-microstrip': [
    widthOverHeight(0.1, 10),
    {
      name: 'gap over height',
      of: ({ gap, below }) => gap / below,
      from: 0.1,
      to: 10,
      look: 'gap',
    },
    thicknessOverHeight,
    thicknessOverWidth,
    thicknessOverGap,
    permittivity(18),
  ],
  stripline: [
    {
      name: 'width over plane to plane less copper',
      of: ({ width, below, above }) => width / (below + above),
      from: 0.1,
      to: 10,
      look: 'width',
    },
    thicknessOverSpacing,
    heightOverHeight,
  ],
  'coupled-stripline': [
    {
      name: 'width over plane to plane',
      of: (dimensions) => dimensions.width / spacing(dimensions),
      from: 0.15,
      to: 10,
      look: 'width',
    },
    {
      name: 'gap over plane to plane',
      of: (dimensions) => dimensions.gap / spacing(dimensions),
      from: 0.1,
      to: null,
      look: 'gap',
    },
    thicknessOverSpacing,
    thicknessOverGap,
    heightOverHeight,
  ],
}
