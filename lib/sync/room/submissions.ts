import type { Operation } from '../../sheet/change'
import type { Bindings } from './bindings'
import { Desk, submitClientId } from './desk'
import { type Answer, NO_UPDATE, refused } from './queued'
import type { Asked, WritePath } from './writePath'

/** Edits that are made here from operations, for whoever has no document of their own (write path, rule 9). */
export class Submissions {
  private readonly desk: Desk

  constructor(
    private readonly budget: string,
    private readonly path: WritePath,
    private readonly bindings: Bindings,
  ) {
    this.desk = new Desk(() => path.intake.state())
  }

  /** @param expectedSeq refused with 'conflict' where a later entry, or one that waits, has changed the budget */
  async submit(asked: Asked, operations: readonly Operation[], expectedSeq: number | null): Promise<Answer> {
    const answer = await new Promise<Answer>((resolve, reject) => {
      const enter = () => this.enter(asked, operations, expectedSeq, resolve)
      this.path.receive(asked, enter, resolve).catch(reject)
    })
    // A draft that the gate did not take must not stay on the desk.
    if ('code' in answer) this.desk.drop()
    return answer
  }

  /** An update was accepted. */
  follow(update: Uint8Array): void {
    this.desk.follow(update)
  }

  /** Something that was accepted does not stand any more. */
  drop(): void {
    this.desk.drop()
  }

  private enter(
    asked: Asked,
    operations: readonly Operation[],
    expectedSeq: number | null,
    answer: (answer: Answer) => void,
  ): void {
    const { path, budget, bindings } = this
    if (expectedSeq !== null && (path.lastEdit.seq > expectedSeq || path.intake.hasEdits)) {
      answer(refused(asked, { code: 'conflict', reason: 'The budget was changed meanwhile; read it again.' }))
      return
    }
    const { person } = asked.actor.identity
    const clientId = submitClientId(budget, person, (id) => bindings.mayUse(id, person))
    const update = this.desk.draft(operations, clientId)
    if (!(update instanceof Uint8Array)) {
      answer(refused(asked, update))
      return
    }
    const incoming = { ...asked, from: null, clientId, update }
    if (update === NO_UPDATE) path.accept(incoming, path.intake.nothing(), answer)
    else path.offer(incoming, answer)
  }
}
