import { differentialTwoPort, formatPortMap, guessPortMap, type PortMap, parsePortMap } from '../../../channel/networks'
import type { Network } from '../../../channel/networks/network'
import { RESISTANCE, typedValue } from '../../quantities'
import { livingRecord, nameOf } from '../../record'
import type { RecordOf } from '../../schema'
import type { ModelInput } from '../model'
import { rememberedOf } from './remembered'

type EvidenceRecord = RecordOf<'evidence'>
type Field = 'evidence' | 'fixture' | 'shortEvidence'

/**
 * The differential two-port that a file of the line holds, in the reference that the file has.
 * @returns null after writing down why there is none
 */
export function twoPortOf(input: ModelInput, field: Field): Network | null {
  const { fields, line, budget, evidence } = input
  const record = livingRecord(budget, 'evidence', line[field])
  if (record === null || record.sha256 === null) {
    const taken = line[field] !== null
    return fields.say(
      'evidence-missing',
      field,
      `${fields.name}: ${taken ? 'its file does not exist or was taken out' : 'no file is attached'}.`,
      'Attach the Touchstone file that the line is to count by.',
    )
  }
  const read = evidence.get(record.sha256)
  const file = nameOf('evidence', line[field], record)
  if (read === undefined) {
    return fields.say(
      'evidence-not-read',
      field,
      `${fields.name}: the file ${file} has not been read.`,
      'Wait until it is read; if it stays so, attach it again.',
    )
  }
  if ('problem' in read) {
    return fields.say('evidence-unreadable', field, `${fields.name}: the file ${file} cannot be read.`, read.problem)
  }
  return chosen(input, field, record, read.network)
}

function chosen(input: ModelInput, field: Field, record: EvidenceRecord, network: Network): Network | null {
  const { fields } = input
  if (network.ports === 2 && record.modes === null) {
    return fields.say(
      'modes-missing',
      field,
      `${fields.name}: its file has two ports and does not say whether they are single-ended or a differential pair.`,
      "Say it at the file: 'single-ended', or 'mixed-as-two-ports' for a differential pair saved as two ports.",
    )
  }
  const map = mapOf(input, field, record, network)
  if (map === null) return null
  if (map.from.length === 1 && record.modes !== 'mixed-mode' && record.modes !== 'mixed-as-two-ports') {
    fields.say(
      'single-ended-taken-as-differential',
      field,
      `${fields.name}: its file is single-ended; a pair of two such lines without coupling is taken, at twice the file's reference.`,
      'Attach a file of the pair with four ports.',
    )
  }
  const key = `${formatPortMap(map)}|${record.modes}|${record.reference}`
  return twoPorts(network, key, () => inModes(network, map, record))
}

const twoPorts = rememberedOf<Network>()

function inModes(network: Network, map: PortMap, { modes, reference }: EvidenceRecord): Network {
  const twoPort = differentialTwoPort(network, map)
  if (map.from.length === 2 || modes === 'mixed-mode') return twoPort
  if (modes !== 'mixed-as-two-ports') return { ...twoPort, reference: twoPort.reference.map((part) => 2 * part) }
  const said = typedValue(RESISTANCE, reference)
  return said === null ? twoPort : { ...twoPort, reference: Float64Array.of(said, 0, said, 0) }
}

const guesses = rememberedOf<ReturnType<typeof guessPortMap>>()

function mapOf(input: ModelInput, field: Field, record: EvidenceRecord, network: Network) {
  const { fields, line } = input
  const typed = field === 'evidence' ? (line.portMap?.trim() ?? '') : ''
  const text = typed === '' && record.modes === 'mixed-mode' ? '1>2' : typed
  if (text !== '') {
    const map = parsePortMap(text, network.ports)
    if (!('reason' in map)) return map
    return fields.say(
      'port-map-unreadable',
      'portMap',
      `${fields.name}: the ports '${text}' cannot be read.`,
      map.reason,
    )
  }
  const guess = guesses(network, '', () => guessPortMap(network))
  if (guess.map === null) {
    return fields.say(
      'port-map-missing',
      'portMap',
      `${fields.name}: which ports are the two ends is not said. ${guess.why}`,
      'Type them, such as 1,3>2,4.',
    )
  }
  if (network.ports > 2) {
    fields.say(
      guess.sure ? 'port-map-guessed' : 'port-map-doubtful',
      field === 'evidence' ? 'portMap' : field,
      `${fields.name}: its ports were taken as ${guess.text}. ${guess.why}`,
      'Type the ports to make sure.',
    )
  }
  return guess.map
}
