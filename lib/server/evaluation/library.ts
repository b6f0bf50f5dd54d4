import { readFile } from 'node:fs/promises'
import type { EvidenceData, EvidenceNetwork } from '../../budget/evaluation'
import { neededFiles } from '../../budget/evidence/needed'
import { readNetwork } from '../../budget/evidence/readNetwork'
import type { Budget } from '../../budget/schema'
import { evidencePath } from '../../records/evidence'

/** Bytes of networks that stay read: some fifty large files. */
const KEPT_BYTES = 256 * 1024 * 1024

/** The networks of evidence files, read once while they are in use. */
export class EvidenceLibrary {
  private readonly kept = new Map<string, EvidenceNetwork>()
  private bytes = 0

  constructor(private readonly directory: string) {}

  /** Reads what a budget's lines count by. A file that is not there is left out, and the evaluation says so. */
  async of(budget: Budget): Promise<EvidenceData> {
    const networks = new Map<string, EvidenceNetwork>()
    for (const { sha256, name } of neededFiles(budget)) {
      const network = await this.find(sha256, name)
      if (network) networks.set(sha256, network)
    }
    return networks
  }

  private async find(sha256: string, name: string): Promise<EvidenceNetwork | null> {
    const key = `${sha256} ${name.slice(name.lastIndexOf('.'))}`
    const known = this.kept.get(key)
    if (known) {
      this.kept.delete(key)
      this.kept.set(key, known)
      return known
    }
    const path = evidencePath(this.directory, sha256)
    const bytes = path && (await readFile(path).catch(() => null))
    if (!bytes) return null
    const read = readNetwork(bytes, name)
    this.kept.set(key, read)
    this.bytes += sizeOf(read)
    for (const [oldest, network] of this.kept) {
      if (this.bytes <= KEPT_BYTES || oldest === key) break
      this.kept.delete(oldest)
      this.bytes -= sizeOf(network)
    }
    return read
  }
}

function sizeOf(read: EvidenceNetwork): number {
  return 'network' in read ? read.network.s.byteLength + read.network.hz.byteLength : 0
}
