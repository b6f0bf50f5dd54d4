import type { Evaluation } from './evaluation'
import type { Lanes } from './lanes'
import type { LineItem } from './lineItem'
import type { Losses } from './losses'
import { compareOrder, inOrder } from './record'
import type { Budget } from './schema'
import type { Signalling } from './signalling'

/** What every step of one evaluation looks at. */
export type Context = {
  readonly budget: Budget
  readonly signalling: Signalling
  /** Living lines in channel order. */
  readonly items: readonly LineItem[]
  /** Living lines and planes in channel order. */
  readonly rows: Evaluation['rows']
  readonly lanes: Lanes
  readonly losses: Losses
  readonly asked: Asked
}

/** What is wanted beside the losses at the allowances' frequencies. */
export type Asked = {
  /** The cascade over frequency of every allowance; without it only of those whose curve or floor needs it. */
  readonly sweep: boolean
  /** Random builds to draw; 0: none. */
  readonly builds: number
}

/** Lines and the planes between them, by fractional index, ties by id. */
export function rowsOf(budget: Budget, items: readonly LineItem[]): Evaluation['rows'] {
  const planes = inOrder(budget, 'planes').map(([id, { order }]) => ({ id, order, row: { plane: id } }))
  const lines = items.map(({ id, line: { order } }) => ({ id, order, row: { line: id } }))
  return [...planes, ...lines].sort((a, b) => compareOrder(a.order, a.id, b.order, b.id)).map(({ row }) => row)
}
