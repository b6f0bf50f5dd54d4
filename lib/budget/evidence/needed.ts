import { livingRecord } from '../record'
import type { Budget } from '../schema'

/** A file that a line counts by. */
export type NeededFile = { readonly sha256: string; readonly name: string }

/** The files whose networks an evaluation reads, each once: those that network lines name and that are attached. */
export function neededFiles(budget: Budget): NeededFile[] {
  const files = new Map<string, NeededFile>()
  for (const id in budget.lines) {
    const line = budget.lines[id]
    if (!line || line.removed || line.model !== 'network') continue
    for (const named of [line.evidence, line.fixture, line.shortEvidence]) {
      const record = livingRecord(budget, 'evidence', named)
      if (record?.sha256) files.set(record.sha256, { sha256: record.sha256, name: record.name ?? '' })
    }
  }
  return [...files.values()]
}
