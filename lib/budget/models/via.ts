import { padCorner } from '../../channel/pads'
import { formatQuantity, formatScaled } from '../../channel/units'
import { padExcess, secondWave, stubResonance, type Via, viaTwoPort } from '../../channel/vias'
import { LENGTH, NUMBER } from '../quantities'
import type { Model, ModelInput } from './model'
import { overPadCorner } from './pad'
import type { Piece, Values } from './piece'
import { type Bound, HIGHEST, holds } from './validity'

const unknown = Number.NaN

function padsOfOneEnd(values: Values): number {
  const { usedDepth = unknown, barrel = unknown, pad = unknown, antipad = unknown, dk = unknown } = values
  return padExcess(usedDepth, barrel, pad, antipad, dk) / 2
}

/** Common practice, no source, where nothing else is said; the rounding and plating of a board's depths may be off by 3 %. */
export const VIA_BOUNDS: readonly Bound[] = [
  { field: 'dk', what: 'effective permittivity', figure: ({ dk = unknown }) => dk, least: 2, most: 10 },
  {
    field: 'pad',
    what: 'pad diameter over that of the barrel',
    figure: ({ pad = unknown, barrel = unknown }) => pad / barrel,
    least: 1,
    most: 4,
  },
  {
    field: 'antipad',
    what: 'antipad diameter over that of the pad',
    figure: ({ antipad = unknown, pad = unknown }) => antipad / pad,
    least: 1.2,
    most: 4,
  },
  {
    // Nearer barrels than thin ones: a boundary-element solution (numpy, own) lies 5 % lower at two diameters.
    field: 'pitch',
    what: 'pitch over the diameter of the barrel',
    figure: ({ pitch = unknown, barrel = unknown }) => pitch / barrel,
    least: 2,
    most: 50,
  },
  {
    field: 'usedDepth',
    what: 'used depth and stub together over the thickness of the board',
    figure: ({ usedDepth = unknown, stub = unknown, boardThickness = unknown }) => (usedDepth + stub) / boardThickness,
    least: 0,
    most: 1.03,
  },
  {
    field: 'stub',
    what: "frequency over the stub's resonance, where it is a quarter wave long,",
    figure: ({ hz = unknown, stub = unknown, dk = unknown }) => hz / stubResonance(stub, dk),
    least: 0,
    most: 1,
  },
  {
    field: 'pad',
    what: 'frequency over that at which the pads of one end take half of the power',
    figure: (values) => overPadCorner(padsOfOneEnd(values), values),
    least: 0,
    most: 1,
  },
  {
    // Pozar, Microwave Engineering: the coaxial line's first higher mode.
    field: 'antipad',
    what: 'frequency over that at which a second wave runs along the barrel',
    figure: ({ hz = unknown, barrel = unknown, antipad = unknown, dk = unknown }) =>
      hz / secondWave(barrel, antipad, dk),
    least: 0,
    most: 1,
  },
]

/** How far this picture of a via may be off (own judgement, no source); counts where no tolerance is typed. */
const UNCERTAINTY = 0.5
/** A stub is kept to a resonance of three times the Nyquist frequency (engineering guidance, from memory). */
const RESONANCE_OVER = 3

/**
 * A pair of vias from its drawing: barrel, pads, stub, `count` of them in a row without line between. Its permittivity is the effective one
 * around the barrel. Without df it has no dielectric loss. The stub is what is left after back-drilling; the drill's tolerance makes
 * it longer or shorter from build to build.
 */
export const via: Model = (input) => {
  const { fields, line } = input
  const need = (field: 'boardThickness' | 'usedDepth' | 'stub' | 'barrel' | 'pad' | 'antipad' | 'pitch') =>
    fields.need(field, LENGTH)
  const typed = {
    boardThickness: need('boardThickness'),
    usedDepth: need('usedDepth'),
    stub: need('stub'),
    barrel: need('barrel'),
    pad: need('pad'),
    antipad: need('antipad'),
    pitch: need('pitch'),
    dk: fields.need('dk', NUMBER),
  }
  const df = fields.may('df', NUMBER)
  const drill = fields.may('drillTolerance', LENGTH)
  if (!isComplete(typed) || df === 'unreadable' || drill === 'unreadable') return null
  const values = df === null ? typed : { ...typed, df }
  if (!holds(input, VIA_BOUNDS, values)) return null
  sayResonance(input, values.stub, drill ?? 0, values.dk)
  return {
    values,
    build: (changed) => pieceOf({ df: 0, ...values, ...changed }, line.count ?? 1, input.reference),
    ...(drill === null ? {} : { varies: { stub: drill } }),
  }
}

type Numbers<T> = { readonly [K in keyof T]: number }

function isComplete<T extends Readonly<Record<string, number | null>>>(values: T): values is T & Numbers<T> {
  return Object.values(values).every((value) => value !== null)
}

function pieceOf(built: Via, count: number, reference: number | null): Piece {
  // A drill that goes through to the used layer leaves no stub, and never less than none.
  const one = { ...built, stub: Math.max(0, built.stub) }
  const wave = secondWave(one.barrel, one.antipad, one.dk)
  const lumped = reference === null ? HIGHEST : padCorner(padsOfOneEnd(one), reference)
  return {
    from: 0,
    to: Math.min(HIGHEST, stubResonance(one.stub, one.dk), wave, lumped),
    reflects: true,
    twoPort: (hz, ohms) => viaTwoPort(one, count, hz, ohms),
    attenuation: null,
    uncertainty: UNCERTAINTY,
  }
}

function sayResonance({ fields, hz }: ModelInput, stub: number, drill: number, dk: number): void {
  const resonance = stubResonance(stub + drill, dk)
  if (resonance >= RESONANCE_OVER * hz) return
  const longestStub = (resonance * (stub + drill)) / (RESONANCE_OVER * hz)
  const longest = formatQuantity(stub + drill, 'length', 'mm', 3)
  fields.say(
    'stub-resonance-near',
    'stub',
    `${fields.name}: a stub of ${longest}${drill > 0 ? ', with the tolerance of the drill,' : ''} resonates at ${formatScaled(resonance, 'frequency', 3)}, under three times ${formatScaled(hz, 'frequency')}.`,
    `Drill deeper, to a stub under ${formatQuantity(longestStub, 'length', 'mm', 2)}, or route on a lower layer.`,
  )
}
