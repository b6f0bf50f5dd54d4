import { PLANE_CODES, type PlaneCode } from '../../../../../lib/budget/schema'
import { planeCodeWord } from '../../../../words/terms'

/** What the closed lists' codes are called on screen. A code that is already a word stands for itself. */
const WORDS: Readonly<Record<string, string>> = {
  // models
  stated: 'stated number',
  class: 'length × loss class',
  'per-length': 'length × loss per length',
  table: 'table of points',
  geometry: 'cross-section',
  'package-line': 'package line (Annex 93A)',
  'ac-capacitor': 'AC capacitor',
  network: 'network file',
  // assemblies, structures, roughness
  'connector-family': 'connector family',
  'coupled-microstrip': 'coupled microstrip',
  'coupled-stripline': 'coupled stripline',
  hammerstad: 'Hammerstad',
  huray: 'Huray',
  'long-uniform': 'a long uniform line',
  discrete: 'a discrete',
  // numbers
  '1-sigma': '1 σ',
  '3-sigma': '3 σ',
  '95-percent': '95 %',
  rss: 'RSS',
  worst: 'worst case',
  line: 'the line rate, overhead included',
  payload: 'the payload rate, before overhead',
  'low-loss': 'low-loss extreme',
  'high-loss': 'high-loss extreme',
  // sources
  read: 'read in a source',
  'two-sources': 'two sources',
  'from-memory': 'from memory',
  own: "the project's own",
  // covers
  'die-pad': 'die pad',
  'bump-pad': 'bump pad',
  'package-trace': 'package trace',
  'ball-via': 'ball via',
  'breakout-a': 'breakout A',
  'breakout-b': 'breakout B',
  'footprint-via-a': 'footprint via A',
  'footprint-via-b': 'footprint via B',
  'mating-interface': 'mating interface',
  'paddle-cards': 'paddle cards',
  'mated-pairs': 'mated pairs',
  'test-fixtures': 'test fixtures',
  // evidence
  'single-ended': 'single-ended',
  'mixed-as-two-ports': 'mixed mode saved as two ports',
  'mixed-mode': 'mixed mode',
  in: 'in the data',
  none: 'none used',
}

/** A code of a closed list, in words. */
export function wordOf(code: string): string {
  return isPlane(code) ? planeCodeWord(code) : (WORDS[code] ?? code)
}

const isPlane = (code: string): code is PlaneCode => (PLANE_CODES as readonly string[]).includes(code)
