import { dfAt, dkAt, widebandDebye } from '../../channel/materials/widebandDebye'
import { FREQUENCY, LENGTH, NUMBER, typedValue } from '../quantities'
import type { RecordOf } from '../schema'

type Layer = RecordOf<'layers'>

/** What several dielectric layers are together to a wave. */
export type Laminate = { readonly dk: number; readonly df: number; readonly anchor: number }

/**
 * The layers of one side are capacitors in series: Dk = Σh/Σ(h/Dk), Df weighted by the energy that each holds, h/Dk. Below and
 * above the strip are capacitors in parallel, each Dk/h of its side. Layers measured at other frequencies are brought to
 * the first one's by the wideband Debye model.
 * @param sides layers between strip and plane, of each side that has a plane
 * @returns half a sentence where a layer does not say what it is
 */
export function laminateOf(sides: readonly (readonly Layer[])[]): Laminate | string {
  const anchor = typedValue(FREQUENCY, sides.flat().find(isDielectric)?.anchor ?? null)
  if (anchor === null) return 'the dielectric layers around it do not say which frequency Dk and Df hold at'
  let capacitance = 0
  let lost = 0
  let vacuum = 0
  for (const side of sides) {
    let height = 0
    let inverse = 0
    let energy = 0
    for (const layer of side.filter(isDielectric)) {
      const read = layerAt(layer, anchor)
      if (typeof read === 'string') return read
      height += read.height
      inverse += read.height / read.dk
      energy += (read.height / read.dk) * read.df
    }
    if (height === 0) return 'there is no dielectric between it and a plane'
    capacitance += 1 / inverse
    lost += energy / inverse ** 2
    vacuum += 1 / height
  }
  return { dk: capacitance / vacuum, df: lost / capacitance, anchor }
}

/** Thickness of layers in m; copper of other signal layers between strip and plane counts as height. */
export function heightOf(layers: readonly Layer[]): number | string {
  let height = 0
  for (const layer of layers) {
    const thickness = typedValue(LENGTH, layer.thickness)
    if (thickness === null) return `its layer '${layer.name ?? ''}' has no thickness that can be read`
    height += thickness
  }
  return height
}

export function isDielectric(layer: Layer): boolean {
  return layer.role === 'core' || layer.role === 'prepreg'
}

function layerAt(layer: Layer, anchor: number): { height: number; dk: number; df: number } | string {
  const height = typedValue(LENGTH, layer.thickness)
  const dk = typedValue(NUMBER, layer.dk)
  const df = typedValue(NUMBER, layer.df)
  const own = typedValue(FREQUENCY, layer.anchor)
  if (height === null || dk === null || df === null || own === null) {
    return `its layer '${layer.name ?? ''}' lacks thickness, Dk, Df or the frequency they hold at`
  }
  if (own === anchor) return { height, dk, df }
  const model = widebandDebye(dk, df, own)
  const moved = dkAt(model, anchor)
  return { height, dk: moved, df: dfAt(model, anchor, moved) }
}
