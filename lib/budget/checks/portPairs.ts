import { guessPortMap } from '../../channel/networks/guessPortMap'
import type { Network } from '../../channel/networks/network'
import { type End, formatPortMap, type PortMap, parsePortMap } from '../../channel/networks/portMap'
import type { FlagDraft } from '../flags'
import type { LineItem } from '../lineItem'
import { livingRecord } from '../record'
import type { Check } from './check'
import { lineFlag } from './lineFlag'

/** Port maps of four-port files against what their low frequencies show. */
export const portPairs: Check = function* ({ context: { budget, items }, evidence }) {
  if (evidence.size === 0) return
  for (const item of items) {
    if (item.line.model !== 'network' || item.line.portMap === null) continue
    const read = evidence.get(livingRecord(budget, 'evidence', item.line.evidence)?.sha256 ?? '')
    if (read !== undefined && 'network' in read) yield* doubts(item, item.line.portMap, read.network)
  }
}

const guesses = new WeakMap<Network, ReturnType<typeof guessPortMap>>()

function* doubts(item: LineItem, text: string, network: Network): Generator<FlagDraft> {
  if (network.ports !== 4) return
  const typed = parsePortMap(text, network.ports)
  const guess = guesses.get(network) ?? guessPortMap(network)
  guesses.set(network, guess)
  if ('reason' in typed || guess.map === null || !guess.sure || sameConductors(typed, guess.map)) return
  yield lineFlag(
    item,
    'port-pairs-doubtful',
    'portMap',
    `takes the ports of its file as ${formatPortMap(typed)}; the file looks like ${guess.text}. ${guess.why}`,
    'Look up how the ports of the file were numbered, and correct the port map.',
  )
}

/** Whether both maps join the same ports, whichever end or conductor comes first: which one is + does not show in a file. */
function sameConductors(a: PortMap, b: PortMap): boolean {
  return conductors(a) === conductors(b)
}

function conductors({ from, to }: PortMap): string {
  const near: End = from
  return near
    .map((port, n) => [port, to[n] ?? -1].sort((x, y) => x - y).join('-'))
    .sort()
    .join(' ')
}
