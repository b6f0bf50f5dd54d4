import { AT_NYQUIST, WHOLE } from '../../budget/evaluate'
import type { Evaluation } from '../../budget/evaluation'
import type { Journal } from '../../records/journal/types'
import { readBudget } from '../../sheet/seed'
import type { Evaluator } from '../evaluator'
import { loadDocument } from '../room/load'
import type { BudgetState } from '../room/room'
import type { Locked, Rooms } from '../rooms'

/** Budgets and evaluations that stay in memory. */
const REMEMBERED = 200

type Depth = 'verdicts' | 'whole'
type Kept = BudgetState & { readonly evaluations: Partial<Record<Depth, Promise<Evaluation>>> }

/** Reads budgets and their evaluations as committed; each is computed once for one head. */
export class Reader {
  private readonly kept = new Map<string, Kept>()

  constructor(
    private readonly journal: Journal,
    private readonly rooms: Rooms,
    private readonly evaluator: Evaluator,
  ) {}

  /** @returns null where the journal does not hold the budget */
  async read(budget: string): Promise<BudgetState | Locked | null> {
    return this.find(budget)
  }

  async evaluation(budget: string, depth: Depth): Promise<(BudgetState & { evaluation: Evaluation }) | Locked | null> {
    const found = await this.find(budget)
    if (found === null || 'locked' in found) return found
    const asked = depth === 'whole' ? WHOLE : AT_NYQUIST
    found.evaluations[depth] ??= this.evaluator.evaluate(found.budget, asked).catch((cause) => {
      delete found.evaluations[depth]
      throw cause
    })
    return { ...found, evaluation: await found.evaluations[depth] }
  }

  /** Evaluates anew when next asked, although the budget is the same: a file that it names has come. */
  forget(budget: string): void {
    this.kept.delete(budget)
  }

  private async find(budget: string): Promise<Kept | Locked | null> {
    const open = this.rooms.peek(budget)
    if (open) return this.keep(budget, open.state)
    const locked = this.rooms.lockOf(budget)
    if (locked) return locked
    const head = await this.journal.head(budget)
    if (!head) return null
    const kept = this.kept.get(budget)
    if (kept?.head.hash === head.hash) return kept
    const loaded = await loadDocument(this.journal, budget)
    if (loaded === null) return null
    if ('damaged' in loaded) return this.rooms.lock(budget, loaded.damaged)
    const state = { budget: readBudget(loaded.doc), head: loaded.head, lastEdit: loaded.lastEdit }
    loaded.doc.destroy()
    return this.keep(budget, state)
  }

  /** A binding moves the head and changes nothing, so the last edit says whether an evaluation still holds. */
  private keep(budget: string, state: BudgetState): Kept {
    const before = this.kept.get(budget)
    const evaluations = before?.lastEdit.hash === state.lastEdit.hash ? before.evaluations : {}
    const kept = { ...state, evaluations }
    this.kept.delete(budget)
    this.kept.set(budget, kept)
    const [oldest] = this.kept.keys()
    if (this.kept.size > REMEMBERED && oldest !== undefined) this.kept.delete(oldest)
    return kept
  }
}
