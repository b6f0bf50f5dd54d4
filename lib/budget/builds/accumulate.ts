import type { Change, Term } from './plan'
import type { Response } from './response'
import { BLOCK, type Source } from './source'

/** Adds what follows a deviate. Where the sides differ each half of the distribution has its own standard deviation. */
export function addTerms(terms: readonly Term[], into: Float64Array): void {
  for (const { source, rectangular, up, down } of terms) {
    const deviates = rectangular && source.rectangular !== null ? source.rectangular : source.normal
    if (up === down) {
      for (let n = 0; n < BLOCK; n++) into[n] = (into[n] as number) + (deviates[n] as number) * up
    } else {
      for (let n = 0; n < BLOCK; n++) {
        const deviate = deviates[n] as number
        into[n] = (into[n] as number) + deviate * (deviate > 0 ? up : down)
      }
    }
  }
}

/** Adds responses; one with the same sources in several lanes is computed once in a block. */
export class Changes {
  private readonly known = new Map<Response, { readonly sources: readonly Source[]; readonly db: Float64Array }[]>()

  forget(): void {
    this.known.clear()
  }

  addKept(changes: readonly Change[], into: Float64Array): void {
    for (const change of changes) addTimes(this.kept(change), change.times, into)
  }

  private kept({ response, sources }: Change): Float64Array {
    const ofResponse = this.known.get(response) ?? []
    this.known.set(response, ofResponse)
    const same = ofResponse.find((entry) => entry.sources.every((source, k) => source === sources[k]))
    if (same) return same.db
    const db = new Float64Array(BLOCK)
    computeChange(response, sources, db)
    ofResponse.push({ sources, db })
    return db
  }
}

const scratch = new Float64Array(BLOCK)

export function addChanges(changes: readonly Change[], into: Float64Array): void {
  for (const { response, sources, times } of changes) {
    computeChange(response, sources, scratch)
    addTimes(scratch, times, into)
  }
}

function addTimes(db: Float64Array, times: number, into: Float64Array): void {
  for (let n = 0; n < BLOCK; n++) into[n] = (into[n] as number) + times * (db[n] as number)
}

/** A tolerance is three standard deviations; a draw past what the parameter can be ends there. */
function computeChange({ change, down, up }: Response, sources: readonly Source[], db: Float64Array): void {
  const parameters = sources.length
  const shares = new Float64Array(parameters)
  for (let n = 0; n < BLOCK; n++) {
    for (let k = 0; k < parameters; k++) {
      const share = ((sources[k] as Source).normal[n] as number) / 3
      const [low, high] = [-(down[k] as number), up[k] as number]
      shares[k] = Math.min(high, Math.max(low, share))
    }
    db[n] = change(shares)
  }
}
