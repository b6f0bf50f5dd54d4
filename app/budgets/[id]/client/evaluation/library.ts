import type { EvidenceData, EvidenceNetwork } from '../../../../../lib/budget/evaluation'
import { type NeededFile, neededFiles } from '../../../../../lib/budget/evidence/needed'
import { readNetwork } from '../../../../../lib/budget/evidence/readNetwork'
import type { Budget } from '../../../../../lib/budget/schema'
import { readAs } from './readAs'

/** The bytes of a file; null: the server has none. */
export type FetchFile = (budgetId: string, file: NeededFile) => Promise<Uint8Array | null>

/** The worker's networks of evidence files, each read once. What could not be fetched is fetched again when it is asked for. */
export class EvidenceLibrary {
  private readonly kept = new Map<string, EvidenceNetwork>()
  private readonly coming = new Map<string, Promise<EvidenceNetwork | null>>()

  constructor(private readonly fetchFile: FetchFile) {}

  async find(budgetId: string, file: NeededFile): Promise<EvidenceNetwork | null> {
    const key = readAs(file)
    const known = this.kept.get(key) ?? this.coming.get(key)
    if (known) return known
    const coming = this.read(budgetId, file)
    this.coming.set(key, coming)
    try {
      const network = await coming
      if (network) this.kept.set(key, network)
      return network
    } finally {
      this.coming.delete(key)
    }
  }

  /** What a budget's lines count by. A file that the server does not have is left out, and the evaluation says so. */
  async of(budgetId: string, budget: Budget): Promise<EvidenceData> {
    const networks = new Map<string, EvidenceNetwork>()
    for (const file of neededFiles(budget)) {
      const network = await this.find(budgetId, file)
      if (network) networks.set(file.sha256, network)
    }
    return networks
  }

  private async read(budgetId: string, file: NeededFile): Promise<EvidenceNetwork | null> {
    const bytes = await this.fetchFile(budgetId, file)
    return bytes && readNetwork(bytes, file.name)
  }
}
