import { contentName } from './contentName'
import type { EvidenceData, EvidenceNetwork } from './evaluation'
import { livingRecord } from './record'
import type { Budget, Line } from './schema'

/** A name of what a computed line says by other records: its evidence and what was read of it, or its assembly's layers. */
export function restsOn(budget: Budget, evidence: EvidenceData, line: Line): string {
  if (line.model === 'network') {
    const ids = [line.evidence, line.fixture, line.shortEvidence]
    return ids.map((id) => (id === null ? '' : fileContent(budget, evidence, id))).join(';')
  }
  return line.model === 'geometry' && line.layer !== null ? stackContent(budget, line.assembly) : ''
}

function fileContent(budget: Budget, evidence: EvidenceData, id: string): string {
  const record = livingRecord(budget, 'evidence', id)
  if (record === null) return 'gone'
  const read = evidence.get(record.sha256 ?? '')
  return `${contentName('evidence', id, record)}:${read === undefined ? 'unread' : nameOfRead(read)}`
}

const names = new WeakMap<EvidenceNetwork, number>()
let named = 0

function nameOfRead(read: EvidenceNetwork): number {
  const known = names.get(read)
  if (known !== undefined) return known
  named++
  names.set(read, named)
  return named
}

function stackContent(budget: Budget, assembly: string | null): string {
  let name = ''
  for (const id in budget.layers) {
    const layer = budget.layers[id]
    if (layer && layer.assembly === assembly && !layer.removed) name += `${contentName('layers', id, layer)},`
  }
  return name
}
