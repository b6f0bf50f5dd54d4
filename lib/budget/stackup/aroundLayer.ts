import { inOrder } from '../record'
import type { Budget, RecordOf } from '../schema'

type Layer = RecordOf<'layers'>

/** A signal layer with what lies between it and the next plane on each side, nearest first; null: no plane on that side. */
export type AroundLayer = {
  readonly signal: Layer
  readonly above: readonly Layer[] | null
  readonly below: readonly Layer[] | null
}

/**
 * Looks a signal layer up in the stack-up of an assembly, top first.
 * @returns half a sentence where there is none
 */
export function aroundLayer(budget: Budget, assembly: string | null, name: string): AroundLayer | string {
  const layers = inOrder(budget, 'layers')
    .map(([, layer]) => layer)
    .filter((layer) => layer.assembly === assembly)
  const wanted = layers.filter((layer) => layer.role === 'signal' && layer.name?.trim() === name.trim())
  const [signal] = wanted
  if (signal === undefined) return `the stack-up of its assembly has no signal layer '${name}'`
  if (wanted.length > 1) return `the stack-up of its assembly has several signal layers '${name}'`
  const at = layers.indexOf(signal)
  return { signal, above: untilPlane(layers.slice(0, at).reverse()), below: untilPlane(layers.slice(at + 1)) }
}

function untilPlane(layers: readonly Layer[]): readonly Layer[] | null {
  const plane = layers.findIndex((layer) => layer.role === 'plane')
  return plane < 0 ? null : layers.slice(0, plane)
}
