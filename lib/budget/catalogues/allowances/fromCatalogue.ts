import { inOrder } from '../../record'
import type { Allowance, Budget, PlaneCode } from '../../schema'
import type { AllowanceEntry } from './entry'
import { mirrored } from './mirrored'
import { OWN_COPY_WINS } from './words'

type Taken = Partial<Omit<Allowance, 'order' | 'removed'>>

/**
 * The fields of an allowance record that an entry fills. The published planes are set always; the budget's own planes where
 * it has them, in channel order. An entry that is published for both directions is taken mirrored where only then both
 * planes are there, such as from a module to its host.
 * @returns from and to null where the budget has no such plane: the allowance is then undecided and says so
 */
export function allowanceFromCatalogue(entry: AllowanceEntry, budget: Budget): Taken {
  const { name, limit, at, leastLoss, returnLossFloor, curve, presumedPackage, presumes, body, clause } = entry
  return {
    ...{ name, limit, at, leastLoss, returnLossFloor, curve, presumedPackage, presumes, body, clause },
    ...spanFor(entry, budget),
    confidence: entry.confidence,
    note: noteOf(entry),
  }
}

type Ends = Pick<Taken, 'publishedFrom' | 'publishedTo' | 'from' | 'to'>

function spanFor({ publishedFrom, publishedTo, eitherWay }: AllowanceEntry, budget: Budget): Ends {
  const asPublished = found(budget, publishedFrom, publishedTo)
  if (eitherWay !== true || isWhole(asPublished)) return asPublished
  const turned = found(budget, mirrored(publishedTo), mirrored(publishedFrom))
  return isWhole(turned) ? turned : asPublished
}

const isWhole = ({ from, to }: Ends) => from !== null && to !== null

/** The first plane of the one code and the last of the other behind it: a code may stand at both ends, as a connector's face does. */
function found(budget: Budget, publishedFrom: PlaneCode | null, publishedTo: PlaneCode | null): Ends {
  const planes = inOrder(budget, 'planes')
  const start = planes.findIndex(([, { code }]) => code !== null && code === publishedFrom)
  const end = planes.findLastIndex(([, { code }], place) => code !== null && code === publishedTo && place > start)
  return { publishedFrom, publishedTo, from: planes[start]?.[0] ?? null, to: planes[end]?.[0] ?? null }
}

function noteOf({ status, caution, confidence }: AllowanceEntry): string {
  const kind = status === null ? [] : [`Published as: ${status}.`]
  return [...kind, ...(caution === null ? [] : [caution]), ...(confidence === 'own' ? [] : [OWN_COPY_WINS])].join(' ')
}
