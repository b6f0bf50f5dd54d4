import { LENGTH, typedValue } from '../quantities'
import type { Budget } from '../schema'
import { type AroundLayer, aroundLayer } from './aroundLayer'
import { heightOf, isDielectric, laminateOf } from './laminate'

/** What a stack-up says about a trace on one of its layers, SI; a half sentence where it says nothing. */
export type FromStackup = {
  readonly thickness: number | string
  readonly heightBelow: number | string
  readonly heightAbove: number | string
  readonly laminate: ReturnType<typeof laminateOf>
  /** m, Rz. */
  readonly roughnessTop: number | string
  readonly roughnessBottom: number | string
  /** Dielectric layers around it that do not say by which method Dk and Df were found. */
  readonly withoutMethod: readonly string[]
}

/**
 * Heights reach to the next plane. A microstrip on the bottom of the board has its plane above: its height below is then the one
 * above. Solder mask is left out.
 * @param open a microstrip, with a plane on one side only
 * @returns half a sentence where the layer does not exist or has other planes than the structure
 */
export function fromStackup(
  budget: Budget,
  assembly: string | null,
  layer: string,
  open: boolean,
): FromStackup | string {
  const around = aroundLayer(budget, assembly, layer)
  if (typeof around === 'string') return around
  const sides = [around.below, around.above].filter((side) => side !== null)
  const planes = sides.length
  if (planes !== (open ? 1 : 2)) {
    const found = ['no plane on either side', 'a plane on one side only', 'a plane on both sides'][planes]
    return `layer '${layer}' has ${found} in the stack-up`
  }
  const [first = [], second] = sides
  return {
    ...copper(around),
    heightBelow: heightOf(first),
    heightAbove: second === undefined ? 'there is no plane above' : heightOf(second),
    laminate: laminateOf(sides),
    withoutMethod: sides
      .flat()
      .filter((dielectric) => isDielectric(dielectric) && (dielectric.method?.trim() ?? '') === '')
      .map(({ name }) => `'${name ?? ''}'`),
  }
}

function copper({ signal }: AroundLayer): Pick<FromStackup, 'thickness' | 'roughnessTop' | 'roughnessBottom'> {
  const said = (field: 'thickness' | 'roughnessTop' | 'roughnessBottom', what: string) =>
    typedValue(LENGTH, signal[field]) ?? `its layer '${signal.name ?? ''}' does not say ${what}`
  return {
    thickness: said('thickness', 'the thickness of the copper'),
    roughnessTop: said('roughnessTop', 'the Rz of its upper side'),
    roughnessBottom: said('roughnessBottom', 'the Rz of its lower side'),
  }
}
