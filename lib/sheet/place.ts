import type { Budget, Scalar } from '../budget/schema'
import type { Operation, Place } from './change'

/** One string for a place, for sets and maps of places: 'section/id/field', where the head has no id. */
export function placeKey(place: Place): string {
  return place.section === 'head' ? `head//${place.field}` : `${place.section}/${place.id}/${place.field}`
}

/** The places that an operation writes; of an added record, every field that it was given. */
export function placesOf(operation: Operation): Place[] {
  switch (operation.op) {
    case 'add': {
      const { section, id, values } = operation
      return Object.keys(values).map((field) => ({ section, id, field }))
    }
    case 'lane':
      return [{ section: 'laneValues', id: operation.line, field: `${operation.lane}/${operation.field}` }]
    case 'note':
      return [{ section: operation.section, id: operation.id, field: operation.field }]
    case 'set':
      return operation.section === 'head'
        ? [{ section: 'head', id: null, field: operation.field }]
        : [{ section: operation.section, id: operation.id, field: operation.field }]
  }
}

/** The value at a place, or undefined where there is no such record or field. A lane without a value of its own has null. */
export function valueAt(budget: Budget, place: Place): Scalar | undefined {
  if (place.section === 'head') return own<Scalar>(budget.head, place.field)
  if (place.section === 'laneValues') return own<Scalar>(budget.laneValues, `${place.id}/${place.field}`) ?? null
  const record = own<Record<string, Scalar>>(budget[place.section], place.id)
  return record && own<Scalar>(record, place.field)
}

function own<T>(record: Readonly<Record<string, T>>, key: string): T | undefined {
  return Object.hasOwn(record, key) ? record[key] : undefined
}
