import type { Budget, Scalar, SectionName } from '../budget/schema'

type Values = Record<string, Scalar>
type Sections = Record<string, Record<string, Values>>

/** A budget's next state: what is written is copied once, everything else is shared with the state before. */
export type Draft = {
  readonly json: Budget
  has(section: SectionName, id: string): boolean
  add(section: SectionName, id: string, values: Values): void
  /** These set one value and return the one before, null where there was none. */
  setHead(field: string, value: Scalar): Scalar
  setLane(key: string, value: Scalar): Scalar
  setField(section: SectionName, id: string, field: string, value: Scalar): Scalar
}

export function createDraft(before: Budget): Draft {
  // The head and the lane values are flat, sections are one level deeper; both are plain objects by name.
  const json = { ...before } as unknown as Record<string, Values> & Sections
  const copied = new Set<object>()

  function flat(root: string): Values {
    return own(json as Record<string, Values>, root)
  }
  function own<T extends object>(holder: Record<string, T>, key: string): T {
    const present = holder[key]
    if (present !== undefined && copied.has(present)) return present
    const copy = { ...present } as T
    copied.add(copy)
    holder[key] = copy
    return copy
  }
  function set(values: Values, key: string, value: Scalar): Scalar {
    const earlier = Object.hasOwn(values, key) ? values[key] : undefined
    values[key] = value
    return earlier ?? null
  }
  const records = (section: SectionName) => own(json as Sections, section)

  return {
    json: json as unknown as Budget,
    has: (section, id) => Object.hasOwn(before[section], id) || Object.hasOwn((json as Sections)[section] ?? {}, id),
    add(section, id, values) {
      copied.add(values)
      records(section)[id] = values
    },
    setHead: (field, value) => set(flat('head'), field, value),
    setLane: (key, value) => set(flat('laneValues'), key, value),
    setField: (section, id, field, value) => set(own(records(section), id), field, value),
  }
}
