import { createHash } from 'node:crypto'
import { readdir, readFile, stat } from 'node:fs/promises'
import { join } from 'node:path'
import type { EvidenceData } from '../../budget/evaluation'
import { neededFiles } from '../../budget/evidence/needed'
import { readNetwork } from '../../budget/evidence/readNetwork'
import { type Budget, LIMITS } from '../../budget/schema'

/** The files that a budget counts by, found in a folder by their SHA-256; names do not matter. What is not there is left out. */
export async function evidenceBeside(budget: Budget, folder: string): Promise<EvidenceData> {
  const needed = new Map(neededFiles(budget).map((file) => [file.sha256, file]))
  const found = new Map<string, ReturnType<typeof readNetwork>>()
  if (needed.size === 0) return found
  for (const name of await readdir(folder)) {
    const path = join(folder, name)
    const about = await stat(path)
    if (!about.isFile() || about.size > LIMITS.evidenceBytes) continue
    const bytes = await readFile(path)
    const file = needed.get(createHash('sha256').update(bytes).digest('hex'))
    if (file) found.set(file.sha256, readNetwork(bytes, file.name))
  }
  return found
}
