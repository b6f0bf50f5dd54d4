import { fillNormal, fillRectangular, type Stream, streamOf } from '../../channel/statistics'

/** Builds drawn at a time: few enough for what is drawn to stay in the processor's cache. */
export const BLOCK = 1024

/** Something that varies from build to build, as deviates of a block of builds. */
export type Source = {
  readonly stream: Stream
  readonly normal: Float64Array
  /** The same deviates, anywhere within ±√3; null where nothing asks for them. */
  rectangular: Float64Array | null
}

export function drawBlock({ stream, normal, rectangular }: Source): void {
  fillNormal(stream, normal)
  if (rectangular !== null) fillRectangular(normal, rectangular)
}

/** What all lanes of a build have in common, by name; made when it is first asked for. */
export class CommonSources {
  private readonly byName = new Map<string, Source>()
  constructor(private readonly seed: number) {}

  get(name: string): Source {
    const known = this.byName.get(name)
    if (known) return known
    const made = { stream: streamOf(this.seed, name), normal: new Float64Array(BLOCK), rectangular: null }
    this.byName.set(name, made)
    return made
  }

  names(): string[] {
    return [...this.byName.keys()]
  }

  all(): Source[] {
    return [...this.byName.values()]
  }
}

/** What each lane has for itself. Lanes are drawn one after the other, so they share the memory for their deviates. */
export class OwnSources {
  private readonly labels = new Set<string>()
  private readonly memory: Float64Array[] = []
  constructor(private readonly seed: number) {}

  lane(lane: number): LaneSources {
    return new LaneSources(this.seed, lane, this.labels, this.memory)
  }

  names(): string[] {
    return [...this.labels]
  }
}

export class LaneSources {
  readonly all: Source[] = []
  constructor(
    private readonly seed: number,
    private readonly lane: number,
    private readonly labels: Set<string>,
    private readonly memory: Float64Array[],
  ) {}

  get(label: string): Source {
    this.mention(label)
    return this.named(`${label} lane ${this.lane}`)
  }

  /** One deviate for several lines, which are to be mentioned. */
  together(): Source {
    return this.named(`lane ${this.lane}`)
  }

  mention(label: string): void {
    this.labels.add(label)
  }

  private named(name: string): Source {
    const place = this.all.length
    this.memory[place] ??= new Float64Array(BLOCK)
    const source = { stream: streamOf(this.seed, name), normal: this.memory[place], rectangular: null }
    this.all.push(source)
    return source
  }
}
