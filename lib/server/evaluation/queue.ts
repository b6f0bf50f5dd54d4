import { Worker } from 'node:worker_threads'
import type { Asked } from '../../budget/context'
import type { Budget } from '../../budget/schema'
import type { Evaluator } from '../../sync/evaluator'
import type { Answer, Question } from './message'

/** An evaluation that takes longer has met something that was not foreseen. */
const LONGEST_MS = 120_000
const MEMORY_MB = 1536

type Waiting = {
  readonly budget: Budget
  readonly asked: Asked | null
  readonly files: boolean
  readonly resolve: (answer: Answer) => void
  readonly reject: (error: Error) => void
}

/**
 * Evaluates in a thread of its own, one budget after the other, margins for the trail before whole evaluations. A thread that
 * dies or hangs fails the one question that it was at; the next gets a new thread.
 */
export class EvaluationQueue implements Evaluator {
  private readonly urgent: Waiting[] = []
  private readonly patient: Waiting[] = []
  private current: (Waiting & { readonly id: number; readonly timer: NodeJS.Timeout }) | null = null
  private worker: Worker | null = null
  private asked = 0
  private closed = false

  /** @param file the thread's bundle; @param directory of the evidence files */
  constructor(
    private readonly file: URL,
    private readonly directory: string,
  ) {}

  async evaluate(budget: Budget, asked: Asked) {
    return this.whole(budget, asked, true)
  }

  async evaluateAlone(budget: Budget, asked: Asked) {
    return this.whole(budget, asked, false)
  }

  private async whole(budget: Budget, asked: Asked, files: boolean) {
    const answer = await this.ask(budget, asked, files)
    if ('evaluation' in answer) return answer.evaluation
    throw new Error('The evaluation answered something else than it was asked.')
  }

  async margins(budget: Budget) {
    const answer = await this.ask(budget, null, true)
    if ('margins' in answer) return answer.margins
    throw new Error('The evaluation answered something else than it was asked.')
  }

  async close(): Promise<void> {
    this.closed = true
    const stops = new Error('The server stops.')
    for (const { reject } of [...this.urgent.splice(0), ...this.patient.splice(0)]) reject(stops)
    const { worker } = this
    this.lost(stops)
    await worker?.terminate()
  }

  private ask(budget: Budget, asked: Asked | null, files: boolean): Promise<Answer> {
    if (this.closed) return Promise.reject(new Error('The server stops.'))
    return new Promise((resolve, reject) => {
      const queue = asked === null ? this.urgent : this.patient
      queue.push({ budget, asked, files, resolve, reject })
      this.next()
    })
  }

  private next(): void {
    if (this.current || this.closed) return
    const waiting = this.urgent.shift() ?? this.patient.shift()
    if (!waiting) return
    this.worker ??= this.start()
    const id = ++this.asked
    const timer = setTimeout(() => this.lost(new Error('The evaluation took too long and was stopped.')), LONGEST_MS)
    timer.unref()
    this.current = { ...waiting, id, timer }
    this.worker.postMessage({
      id,
      budget: waiting.budget,
      asked: waiting.asked,
      files: waiting.files,
    } satisfies Question)
  }

  private start(): Worker {
    const worker = new Worker(this.file, {
      workerData: this.directory,
      resourceLimits: { maxOldGenerationSizeMb: MEMORY_MB },
    })
    worker.unref()
    worker.on('message', (answer: Answer) => this.answered(answer))
    worker.on('error', (error) => {
      if (this.worker === worker) this.lost(error instanceof Error ? error : new Error(String(error)))
    })
    worker.on('exit', () => {
      if (this.worker === worker) this.lost(new Error('The thread that evaluates ended.'))
    })
    return worker
  }

  private answered(answer: Answer): void {
    const { current } = this
    if (current?.id !== answer.id) return
    clearTimeout(current.timer)
    this.current = null
    if ('failed' in answer) current.reject(new Error(answer.failed))
    else current.resolve(answer)
    this.next()
  }

  /** The thread is gone or is given up. */
  private lost(error: Error): void {
    const { worker, current } = this
    this.worker = null
    this.current = null
    void worker?.terminate()
    if (current) {
      clearTimeout(current.timer)
      current.reject(error)
    }
    this.next()
  }
}
