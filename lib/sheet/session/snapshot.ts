import type { OutboxRecord } from '../outbox'
import { placeKey, placesOf } from '../place'
import { CONNECTING } from './connectionWords'
import type { SheetOptions, SheetSnapshot } from './types'

/** What a screen shows before anything is loaded. */
export function firstSnapshot(options: SheetOptions): SheetSnapshot {
  return {
    generation: 0,
    budget: null,
    connection: CONNECTING,
    role: null,
    unsaved: 0,
    unsavedPlaces: new Set(),
    refused: [],
    people: [],
    trail: options.trail ?? [],
    lastAcknowledged: null,
    canUndo: false,
    canRedo: false,
    durable: options.storage.durable,
    fault: null,
  }
}

/** How many edits wait, and where. */
export function unsavedOf(records: readonly OutboxRecord[]): Pick<SheetSnapshot, 'unsaved' | 'unsavedPlaces'> {
  const places = records.flatMap((record) => record.deed.operations.flatMap(placesOf))
  return { unsaved: records.length, unsavedPlaces: new Set(places.map(placeKey)) }
}
