import type { Judged } from '../allowance/judge'
import type { FlagDraft } from '../flags'
import type { LineItem } from '../lineItem'
import { livingRecord, nameOf } from '../record'
import type { Budget, PlaneCode } from '../schema'
import type { Check } from './check'
import { type EvidenceRecord, evidenceIdOf, evidenceOf } from './evidence'
import { lineFlag } from './lineFlag'

/** Test points that lie at the far side of a test fixture: the limit contains the fixture (IEEE 802.3, from memory). */
const BEHIND_FIXTURE: readonly (PlaneCode | null)[] = ['tp1', 'tp1a', 'tp2', 'tp3', 'tp4', 'tp4a']

/** Test fixtures: left in, taken out twice, or taken out where the limit contains them. */
export const fixtures: Check = function* ({ context: { budget, items }, judged }) {
  for (const item of items) {
    const evidence = evidenceOf(budget, item)
    const covered = item.line.covers?.includes('test-fixtures') ?? false
    if (evidence === null && !covered) continue
    const name = nameOf('evidence', evidenceIdOf(item), evidence)
    if (covered || evidence?.fixtures === 'in') {
      if (overlapped(budget, item) || item.line.fixture !== null) continue
      if (!wanted(budget, item, judged)) yield left(item, covered ? null : name)
    } else if (evidence?.fixtures === 'removed') yield* removed(budget, item, evidence, name, judged)
    else if (evidence?.fixtures === null && (evidence.ports ?? 0) > 1) {
      yield lineFlag(
        item,
        'fixtures-not-said',
        'evidence',
        `rests on ${name}, which does not say whether test fixtures are in it.`,
        'Say at the evidence whether fixtures are in, removed or were not used.',
      )
    }
  }
}

function left(item: LineItem, file: string | null): FlagDraft {
  return lineFlag(
    item,
    'fixtures-in',
    file === null ? 'covers' : 'evidence',
    `contains test fixtures: ${file === null ? 'its number covers them' : `its file ${file} says so`}.`,
    'Take the number with the fixtures removed, or subtract them by an overlap line that names both lines.',
  )
}

function* removed(
  budget: Budget,
  item: LineItem,
  { fixturesRemovedBy }: EvidenceRecord,
  name: string,
  judged: readonly Judged[],
): Generator<FlagDraft> {
  const again =
    item.line.fixture !== null
      ? 'the line takes a fixture file out of it once more'
      : overlapped(budget, item)
        ? 'an overlap line subtracts a part of it'
        : null
  if (again !== null) {
    const how = (fixturesRemovedBy?.trim() ?? '') === '' ? '' : ` (by ${fixturesRemovedBy?.trim()})`
    yield lineFlag(
      item,
      'fixtures-removed-twice',
      item.line.fixture !== null ? 'fixture' : 'evidence',
      `rests on ${name}, whose fixtures were removed${how}, and ${again}.`,
      'Make sure that the same fixture is not taken out twice.',
    )
  }
  for (const one of judged) {
    const ends = endsBehindFixture(budget, item, one)
    if (ends.length === 0) continue
    yield lineFlag(
      item,
      'fixtures-removed-within-planes',
      'evidence',
      `has its fixtures removed and ends ${nameOf('allowances', one.evaluation.id, one.evaluation)} at ${ends.join(' and ')}, where the limit contains the fixture.`,
      'Take the number with the fixtures in, or add a line for the fixture at that end.',
    )
  }
}

/** Fixtures belong in where the line reaches from one test point behind a fixture to another, in every allowance that counts it. */
function wanted(budget: Budget, item: LineItem, judged: readonly Judged[]): boolean {
  const counting = judged.filter(({ span }) => span.items.includes(item))
  return counting.length > 0 && counting.every((one) => endsBehindFixture(budget, item, one).length === 2)
}

/** Planes of the allowance, behind a fixture, that the line lies directly at. */
function endsBehindFixture(budget: Budget, item: LineItem, { span }: Judged): PlaneCode[] {
  const pieces = span.items.filter(({ line }) => line.kind !== 'reserve' && line.kind !== 'overlap')
  const codeOf = (plane: string | null) => livingRecord(budget, 'planes', plane)?.code ?? null
  const ends = [pieces[0] === item ? codeOf(span.from) : null, pieces.at(-1) === item ? codeOf(span.to) : null]
  return ends.filter((code): code is PlaneCode => code !== null && BEHIND_FIXTURE.includes(code))
}

function overlapped({ lines }: Budget, { id }: LineItem): boolean {
  for (const key in lines) {
    const line = lines[key]
    if (line?.kind === 'overlap' && !line.removed && (line.overlapA === id || line.overlapB === id)) return true
  }
  return false
}
