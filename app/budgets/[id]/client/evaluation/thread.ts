import type { Evaluation, EvidenceNetwork } from '../../../../../lib/budget/evaluation'
import type { NeededFile } from '../../../../../lib/budget/evidence/needed'
import type { Budget } from '../../../../../lib/budget/schema'
import type { Answer, Question } from './message'

type Listening = { heard(answer: Answer): void; lost(why: string): void }
type Running = { send(question: Question): void; stop(): void }
export type StartThread = (listening: Listening) => Running

type Unanswered = { readonly resolve: (answer: Answer) => void; readonly reject: (error: Error) => void }
type WithoutId<Q> = Q extends unknown ? Omit<Q, 'id'> : never

const CLOSED = 'The worksheet was closed.'

/**
 * The page's side of the worker: started with the first question. One that dies fails what it was asked, and the next
 * question gets a new one.
 */
export class EvaluationThread {
  private running: Running | null = null
  private readonly unanswered = new Map<number, Unanswered>()
  private asked = 0
  private closed = false

  constructor(
    private readonly budgetId: string,
    private readonly start: StartThread,
  ) {}

  /** @returns null where the server has no such file */
  async read(file: NeededFile): Promise<EvidenceNetwork | null> {
    const answer = await this.ask({ budgetId: this.budgetId, file })
    if ('network' in answer) return answer.network
    throw new Error(wordsOf(answer))
  }

  async evaluate(budget: Budget): Promise<Evaluation> {
    const answer = await this.ask({ budgetId: this.budgetId, budget })
    if ('evaluation' in answer) return answer.evaluation
    throw new Error(wordsOf(answer))
  }

  close(): void {
    this.closed = true
    this.give(CLOSED)
  }

  private ask(question: WithoutId<Question>): Promise<Answer> {
    const id = ++this.asked
    return new Promise((resolve, reject) => {
      if (this.closed) return reject(new Error(CLOSED))
      this.running ??= this.started()
      this.running.send({ ...question, id })
      this.unanswered.set(id, { resolve, reject })
    })
  }

  private started(): Running {
    return this.start({
      heard: (answer) => {
        this.unanswered.get(answer.id)?.resolve(answer)
        this.unanswered.delete(answer.id)
      },
      lost: (why) => this.give(`The evaluation in this browser stopped (${why}); reload the page if it does again.`),
    })
  }

  /** Gives up the worker, and what it has not answered. */
  private give(why: string): void {
    this.running?.stop()
    this.running = null
    for (const { reject } of this.unanswered.values()) reject(new Error(why))
    this.unanswered.clear()
  }
}

function wordsOf(answer: Answer): string {
  return 'failed' in answer ? answer.failed : 'The evaluation answered something else than it was asked.'
}
