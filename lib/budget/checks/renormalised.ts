import { plainDb } from '../allowance/words'
import type { FlagDraft } from '../flags'
import type { LineItem } from '../lineItem'
import type { Check } from './check'
import { lineFlag } from './lineFlag'

/** From here on the reference of the file is worth a question. Common practice, no source. */
const MATTERS_DB = 0.2

/** Networks whose loss depends on the reference that it is read in. */
export const renormalised: Check = function* ({ context, lines }) {
  for (const item of context.items) {
    if (item.line.model !== 'network' || item.line.taken !== 'discrete') continue
    const loss = lines.get(item.id)?.loss
    const native = loss?.beside.find(({ what }) => what === 'native')?.db
    const counted = loss?.nominalDb ?? null
    if (native === undefined || counted === null || Math.abs(counted - native) <= MATTERS_DB) continue
    yield differs(item, native, counted)
  }
}

function differs(item: LineItem, nativeDb: number, countedDb: number): FlagDraft {
  return lineFlag(
    item,
    'renormalised-differs',
    'evidence',
    `loses ${plainDb(nativeDb)} dB in its file's own reference and counts ${plainDb(countedDb)} dB in the link's.`,
    'Check the reference of the file; the part may be made for another impedance than the link.',
  )
}
