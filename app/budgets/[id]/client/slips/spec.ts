import type { Budget, LANE_FIELDS, Scalar, SectionName } from '../../../../../lib/budget/schema'
import type { Operation, Place } from '../../../../../lib/sheet/change'
import { metaOf } from '../../../../../lib/sheet/layout'
import { placeKey, valueAt } from '../../../../../lib/sheet/place'
import { setField } from '../deeds/records'
import { isRefused, judgeTyped } from '../typed/judge'
import { readTolerance, showTolerance } from '../typed/tolerance'
import { labelOf } from '../words/labels'

/** What a slip shows and how it reads what is typed into it. */
export type SlipSpec = {
  /** Name of the slip, for its draft and for the focus. */
  readonly key: string
  /** The fields that it writes: others may stand on them, and they may be not yet saved. The first names the slip. */
  readonly places: readonly [Place] | readonly [Place, Place]
  readonly label: string
  readonly kind: 'line' | 'note' | 'choice'
  /** What stands in it now, as typed. Of a choice: the code. */
  readonly text: string
  /** The operations that make it so; none where nothing changes; or a sentence that says what to do. */
  readonly judge: (typed: string, budget: Budget, base: string) => readonly Operation[] | { readonly reason: string }
}

/** The slip of one field of one record, or of the head. */
export function fieldSlip(section: 'head' | SectionName, id: string | null, field: string, value: Scalar): SlipSpec {
  const place = { section, id, field } as Place
  const meta = metaOf(section, field)
  const kind =
    meta?.kind === 'choice' || meta?.kind === 'reference' || meta?.kind === 'flag'
      ? 'choice'
      : meta?.kind === 'note'
        ? 'note'
        : 'line'
  return {
    key: placeKey(place),
    places: [place],
    label: labelOf(section, field),
    kind,
    text: typeof value === 'boolean' ? (value ? 'yes' : 'no') : String(value ?? ''),
    judge(typed, budget, base) {
      const judged = judgeTyped(section, field, typed)
      if (isRefused(judged)) return judged
      if (judged.value === (valueAt(budget, place) ?? null)) return []
      if (meta?.kind !== 'note') return [setField(section, id, field, judged.value)]
      if (section === 'head' || id === null) return { reason: 'The budget itself has no note.' }
      return [{ op: 'note', section, id, field: 'note', text: typed, base }]
    },
  }
}

/** Both sides of a tolerance in one slip. */
export function toleranceSlip(
  section: 'lines' | 'lossClasses',
  id: string,
  record: { readonly toleranceMinus: Scalar; readonly tolerancePlus: Scalar },
): SlipSpec {
  const minus: Place = { section, id, field: 'toleranceMinus' }
  const plus: Place = { section, id, field: 'tolerancePlus' }
  return {
    key: placeKey(plus),
    places: [plus, minus],
    label: 'tolerance',
    kind: 'line',
    text: showTolerance({ minus: record.toleranceMinus, plus: record.tolerancePlus }),
    judge(typed, budget) {
      const read = readTolerance(typed)
      if ('reason' in read) return read
      const sides: readonly (readonly [Place, Scalar])[] = [
        [minus, read.minus],
        [plus, read.plus],
      ]
      return sides
        .filter(([place, value]) => (valueAt(budget, place) ?? null) !== value)
        .map(([place, value]) => setField(section, id, place.field, value))
    },
  }
}

/** The value of one lane for one field of a line; empty: the line's own. */
export function laneSlip(
  line: string,
  lane: number,
  field: (typeof LANE_FIELDS)[number],
  value: string | null,
): SlipSpec {
  const place: Place = { section: 'laneValues', id: line, field: `${lane}/${field}` }
  return {
    key: placeKey(place),
    places: [place],
    label: labelOf('laneValues', place.field),
    kind: field === 'lossClass' ? 'choice' : 'line',
    text: value ?? '',
    judge(typed, budget) {
      const judged = judgeTyped('lines', field, typed)
      if (isRefused(judged)) return judged
      if (judged.value === (valueAt(budget, place) ?? null)) return []
      if (typeof judged.value === 'number' || typeof judged.value === 'boolean') return { reason: 'Type a text here.' }
      return [{ op: 'lane', line, lane, field, value: judged.value }]
    },
  }
}
