import { isQuantity, parseQuantity } from '../units'
import { TERMS, type Term } from './piece'

/** One term: a sign, a number, and what it is multiplied with or divided by; a number or a power may be missing. */
const TERM =
  /\s*([+\-−–]?)\s*((?:\d+(?:[.,]\d+)?|[.,]\d+)(?:[eE][+\-−]?\d{1,3})?)?\s*([*·/]?)\s*(sqrt\s*\(\s*f\s*\)|√\s*\(?\s*f\s*\)?|f\s*\^\s*[23]|f[²³]|f)?\s*/iy

/**
 * Reads the terms of one piece: '0.8 + 5.49 sqrt(f) - 0.01 f^3'.
 * @returns the coefficient of each term, 0 where it does not occur, or what is wrong
 */
export function parseTerms(text: string): Record<Term, number> | string {
  if (text.trim() === '') return `type the limit behind the colon, in the terms ${KNOWN}.`
  const found = new Map<Term, number>()
  const reader = new RegExp(TERM)
  while (reader.lastIndex < text.length) {
    const start = reader.lastIndex
    const [whole = '', sign = '', digits = '', operator = '', power = ''] = reader.exec(text) ?? []
    const term = termOf(operator, power)
    const joined = (found.size === 0 || sign !== '') && (digits !== '' || operator === '')
    if (digits + power === '' || term === null || !joined) return `'${text.slice(start).trim()}' ${UNREAD}`
    const coefficient = digits === '' ? 1 : parseQuantity(digits, 'number')
    if (typeof coefficient !== 'number' && !isQuantity(coefficient)) return coefficient.reason
    if (found.has(term)) return `'${whole.trim()}': this term is there twice; add the two.`
    const value = typeof coefficient === 'number' ? coefficient : coefficient.value
    found.set(term, sign === '' || sign === '+' ? value : -value || 0)
  }
  const terms = Object.keys(TERMS) as Term[]
  return Object.fromEntries(terms.map((term) => [term, found.get(term) ?? 0])) as Record<Term, number>
}

const KNOWN = 'c, c sqrt(f), c f, c f^2, c f^3 and c / sqrt(f)'
const UNREAD = `cannot be read; write the terms ${KNOWN} with + or - between.`

/** @returns null for what no limit is written in, such as a division by f */
function termOf(operator: string, power: string): Term | null {
  const plain = power.toLowerCase().replace(/[\s()^]/g, '')
  const root = plain.startsWith('sqrt') || plain.startsWith('√')
  if (operator === '/') return root ? 'inverseRoot' : null
  if (plain === '') return operator === '' ? 'constant' : null
  if (root) return 'root'
  return plain === 'f' ? 'linear' : /[2²]/.test(plain) ? 'square' : 'cube'
}
