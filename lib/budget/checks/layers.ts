import { formatScaled } from '../../channel/units'
import type { FlagDraft } from '../flags'
import type { LineItem } from '../lineItem'
import { FREQUENCY, typedValue } from '../quantities'
import { inOrder, nameOf } from '../record'
import type { Budget } from '../schema'
import type { Check } from './check'
import { isFar } from './laminates'
import { lineFlag } from './lineFlag'

/** Layers that lines and their lanes name, against those of the assembly; and at which frequency a stack-up's Dk and Df hold. */
export const layers: Check = function* ({ context: { budget, items, lanes, signalling } }) {
  const known = layersOf(budget)
  for (const item of items) {
    if (namesLayer(item)) yield* ofItem(item, known)
    for (const other of lanes.differing.get(item.id)?.values() ?? []) {
      if (other.lossClass !== item.lossClass && namesLayer(other)) yield* ofItem(other, known)
    }
  }
  const { nyquist } = signalling.evaluation
  if (known.size > 0 && nyquist !== null) yield* anchors(budget, items, nyquist)
}

function namesLayer({ line, lossClass }: LineItem): boolean {
  return line.layer !== null || (lossClass !== null && lossClass.layer !== null)
}

/** Assembly → names of its layers, as they are compared. */
type Known = ReadonlyMap<string, ReadonlySet<string>>

function layersOf(budget: Budget): Known {
  const found = new Map<string, Set<string>>()
  for (const id in budget.layers) {
    const layer = budget.layers[id]
    if (!layer || layer.removed || layer.assembly === null) continue
    const own = found.get(layer.assembly) ?? new Set()
    found.set(layer.assembly, own.add(plain(layer.name)))
  }
  return found
}

function* ofItem(item: LineItem, known: Known): Generator<FlagDraft> {
  const { line, lossClass } = item
  const where = item.lane === null ? '' : ` in lane ${item.lane}`
  const own = plain(line.layer)
  const ofClass = plain(lossClass?.layer ?? null)
  if (own !== '' && ofClass !== '' && own !== ofClass) {
    yield lineFlag(
      item,
      'class-of-other-layer',
      'lossClass',
      `runs on ${line.layer}, and its loss class${where} is one of ${lossClass?.layer}.`,
      'Choose a loss class of its layer, or correct the layer.',
    )
  }
  const named = ofClass === '' ? own : ofClass
  const there = line.assembly === null ? undefined : known.get(line.assembly)
  if (named === '' || there === undefined || there.has(named)) return
  yield lineFlag(
    item,
    'layer-not-in-assembly',
    ofClass === '' ? 'layer' : 'lossClass',
    `is said to run on ${ofClass === '' ? line.layer : lossClass?.layer}${where}, which the stack-up of ${nameOf('assemblies', line.assembly, item.assembly)} does not have.`,
    'Correct the layer, or add it to the stack-up.',
  )
}

/** Layers of stack-ups that lines are computed from. */
function* anchors(budget: Budget, items: readonly LineItem[], nyquist: number): Generator<FlagDraft> {
  const computed = new Set<string | null>()
  for (const { line } of items) if (line.model === 'geometry' && line.layer !== null) computed.add(line.assembly)
  if (computed.size === 0) return
  for (const [id, layer] of inOrder(budget, 'layers')) {
    const anchor = typedValue(FREQUENCY, layer.anchor)
    if (anchor === null || !computed.has(layer.assembly) || !isFar(anchor, nyquist)) continue
    const [held, asked] = [formatScaled(anchor, 'frequency'), formatScaled(nyquist, 'frequency')]
    yield {
      code: 'anchor-far',
      section: 'layers',
      id,
      field: 'anchor',
      message: `${nameOf('layers', id, layer)} has Dk and Df of ${held}, and lines are computed from it at ${asked}.`,
      todo: `Ask for Dk and Df near ${asked}.`,
    }
  }
}

function plain(name: string | null): string {
  return name === null ? '' : name.trim().toLowerCase()
}
