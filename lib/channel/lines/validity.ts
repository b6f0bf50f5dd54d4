import type { Dimensions } from './crossSection'
import type { Structure } from './structures'

/** A ratio that the formulas of a cross-section hold between. */
export type RatioBound = {
  /** As messages name it. */
  readonly name: string
  readonly of: (dimensions: Dimensions, dielectric: number) => number
  /** 0: no bound below. */
  readonly least: number
  /** Infinity: no bound above. */
  readonly most: number
  /** The dimension that is looked at first where it is outside. */
  readonly look: keyof Dimensions | 'dielectric'
}

const spacing = ({ thickness, below, above }: Dimensions) => below + thickness + above

const widthOverHeight = (most: number): RatioBound => ({
  name: 'width over height',
  of: ({ width, below }) => width / below,
  least: 0.1,
  most,
  look: 'width',
})
const thicknessOverHeight: RatioBound = {
  name: 'copper thickness over height',
  of: ({ thickness, below }) => thickness / below,
  least: 0.001,
  most: 0.6,
  look: 'thickness',
}
const thicknessOverWidth: RatioBound = {
  name: 'copper thickness over width',
  of: ({ thickness, width }) => thickness / width,
  least: 0,
  most: 0.6,
  look: 'thickness',
}
const thicknessOverGap: RatioBound = {
  name: 'copper thickness over gap',
  of: ({ thickness, gap }) => thickness / gap,
  least: 0,
  most: 1,
  look: 'gap',
}
const permittivity: RatioBound = {
  name: 'relative permittivity',
  of: (_, dielectric) => dielectric,
  least: 0,
  most: 18,
  look: 'dielectric',
}
const thicknessOverSpacing: RatioBound = {
  name: 'copper thickness over plane to plane',
  of: (dimensions) => dimensions.thickness / spacing(dimensions),
  least: 0.001,
  most: 0.25,
  look: 'thickness',
}
const heightOverHeight: RatioBound = {
  name: 'larger over smaller height',
  of: ({ below, above }) => Math.max(below, above) / Math.min(below, above),
  least: 0,
  most: 4,
  look: 'above',
}

/**
 * Where each cross-section holds. Microstrip: Kirschning and Jansen 1982, whose εr up to 20 no laminate exceeds; pairs of them Kirschning and
 * Jansen 1984 (ranges from memory). Stripline: Wheeler 1978 (w′ up to 10, from memory). Thickness, the gap of striplines and
 * the ratio of their heights: as far as our own comparison with boundary elements reaches (tests/published/figures).
 */
export const BOUNDS: Readonly<Record<Structure, readonly RatioBound[]>> = {
  microstrip: [widthOverHeight(100), thicknessOverHeight, thicknessOverWidth],
  'coupled-microstrip': [
    widthOverHeight(10),
    {
      name: 'gap over height',
      of: ({ gap, below }) => gap / below,
      least: 0.1,
      most: 10,
      look: 'gap',
    },
    thicknessOverHeight,
    thicknessOverWidth,
    thicknessOverGap,
    permittivity,
  ],
  stripline: [
    {
      name: 'width over plane to plane less copper',
      of: ({ width, below, above }) => width / (below + above),
      least: 0.1,
      most: 10,
      look: 'width',
    },
    thicknessOverSpacing,
    heightOverHeight,
  ],
  'coupled-stripline': [
    {
      name: 'width over plane to plane',
      of: (dimensions) => dimensions.width / spacing(dimensions),
      least: 0.08,
      most: 10,
      look: 'width',
    },
    {
      name: 'gap over plane to plane',
      of: (dimensions) => dimensions.gap / spacing(dimensions),
      least: 0.05,
      most: Number.POSITIVE_INFINITY,
      look: 'gap',
    },
    thicknessOverSpacing,
    thicknessOverGap,
    heightOverHeight,
  ],
}
