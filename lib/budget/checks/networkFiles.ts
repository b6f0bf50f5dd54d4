import type { Network } from '../../channel/networks/network'
import { largestElement, throughFacts } from '../../channel/quality'
import { lowEndLoss } from '../../channel/quality/lowEndLoss'
import { formatQuantity } from '../../channel/units'
import { plainDb } from '../allowance/words'
import { declaredDelay } from '../declaredDelay'
import type { FlagDraft } from '../flags'
import type { LineItem } from '../lineItem'
import type { Check } from './check'
import { type EvidenceRecord, evidenceOf } from './evidence'
import { lineFlag } from './lineFlag'

/** More than a contact or two lose at the lowest frequencies. */
const LOW_END_DB = 0.3
/** Asked about from either on. */
const LONGER_SHARE = 0.1
const LONGER_SECONDS = 30e-12
const RISE_DB = 0.2
/** What rounding in a file and noise of an instrument may reach. */
const GAIN = 1.002

/** Networks that show by themselves that fixtures are left in, or that too much was taken out. */
export const networkFiles: Check = function* ({ context: { budget, items, losses, signalling } }) {
  const { nyquist } = signalling.evaluation
  if (nyquist === null) return
  for (const item of items) {
    if (item.line.model !== 'network') continue
    const twoPort = losses.at(item, nyquist, null).piece?.measured
    if (twoPort) yield* suspicionsOf(item, twoPort, evidenceOf(budget, item))
  }
}

const remembered = new WeakMap<Network, ReturnType<typeof factsOf>>()

function factsOf(twoPort: Network) {
  const through = throughFacts(twoPort)
  return {
    delay: through?.delay ?? null,
    rises: through?.risesDb ?? 0,
    lowEnd: lowEndLoss(twoPort),
    largest: largestElement(twoPort).value,
  }
}

/**
 * What a line's two-port gives away. The thresholds are common practice, no source.
 * @param twoPort differential
 */
export function* suspicionsOf(item: LineItem, twoPort: Network, evidence: EvidenceRecord | null): Generator<FlagDraft> {
  const facts = remembered.get(twoPort) ?? factsOf(twoPort)
  remembered.set(twoPort, facts)
  const declared = declaredDelay(item.line)
  const { delay, lowEnd, rises, largest } = facts
  if (delay !== null && declared !== null && delay - declared > Math.min(LONGER_SHARE * declared, LONGER_SECONDS)) {
    yield lineFlag(
      item,
      'delay-longer-than-length',
      'evidence',
      `takes ${ps(delay)} in its file and ${ps(declared)} by its length; the rest may be fixtures.`,
      'Ask whether fixtures were removed, or correct the length.',
    )
  }
  // A capacitor in series stops the lowest frequencies and lets more through above.
  if (item.line.kind === 'component') return
  if (lowEnd !== null && lowEnd > LOW_END_DB) {
    yield lineFlag(
      item,
      'loss-at-low-end',
      'evidence',
      `still loses ${plainDb(lowEnd)} dB towards 0 Hz in its file, which no line does.`,
      'Ask whether fixtures, contacts or an attenuator are in the file, and whether the ports are the right ones.',
    )
  }
  if (evidence?.fixtures !== 'removed' && item.line.fixture === null) return
  if (rises > RISE_DB) {
    yield lineFlag(
      item,
      'rises-after-removal',
      'evidence',
      `loses ${plainDb(rises)} dB less in the upper third of its file than in the lower, after its fixtures were removed.`,
      'Look at the fixture standards: too much was taken out, or the fixtures differ from their standard.',
    )
  }
  if (largest > GAIN) {
    yield lineFlag(
      item,
      'gain-after-removal',
      'evidence',
      `gives out up to ${largest.toPrecision(4)} times what goes in, after its fixtures were removed.`,
      'Look at the fixture standards; a passive part never amplifies.',
    )
  }
}

function ps(seconds: number): string {
  return formatQuantity(seconds, 'time', 'ps', 4)
}
