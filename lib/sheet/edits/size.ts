import type { Scalar } from '../../budget/schema'
import type { Operation } from '../change'
import { fieldsOf } from '../layout'

/** More bytes than Yjs spends on the ids, lengths and marks of one written entry. */
const PER_WRITE = 40

/** An upper bound of the bytes of the update that these operations make, found without making it. */
export function editSize(operations: readonly Operation[]): number {
  return operations.reduce((sum, operation) => sum + operationSize(operation), 0)
}

function operationSize(operation: Operation): number {
  switch (operation.op) {
    case 'set':
      return PER_WRITE + bytes(operation.id) + bytes(operation.field) + bytes(operation.value)
    case 'note':
      return PER_WRITE + bytes(operation.text)
    case 'lane':
      // Made empty, then set: two writes.
      return 2 * (PER_WRITE + bytes(operation.line) + bytes(operation.field)) + bytes(operation.value)
    case 'add':
      return fieldsOf(operation.section).reduce(
        (sum, field) => sum + PER_WRITE + bytes(field) + bytes(operation.values[field] ?? null),
        2 * PER_WRITE + bytes(operation.id),
      )
  }
}

function bytes(value: Scalar): number {
  if (typeof value !== 'string') return 10
  // UTF-8 takes at most 3 bytes for one UTF-16 code unit; most of what is typed here is ASCII.
  return /[^\0-\x7f]/.test(value) ? 3 * value.length : value.length
}
