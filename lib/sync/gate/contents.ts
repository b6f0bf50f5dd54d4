import * as Y from 'yjs'
import { refuseValue } from '../../sheet/layout'
import { refuse } from './refusal'
import type { Spot } from './spot'

const LONE_SURROGATE = /[\ud800-\udbff](?![\udc00-\udfff])|(?<![\ud800-\udbff])[\udc00-\udfff]/

/** Judges what an item brings to its spot. @throws Refuse */
export function judgeContent(spot: Spot, content: Y.Item['content']): void {
  if (spot.at === 'record') judgeContainer(content, Y.Map, 'A section holds records')
  else if (spot.at === 'note') judgeContainer(content, Y.Text, 'A note is plain text')
  // Deleted: the same edit has already overwritten or erased it.
  else if (content instanceof Y.ContentDeleted) return
  else if (spot.at === 'text') judgeCharacters(content)
  else judgeField(spot, content)
}

function judgeCharacters(content: Y.Item['content']): void {
  if (!(content instanceof Y.ContentString)) refuse('outside-layout', 'A note has plain text, no marks or objects.')
  judgeText(content.str)
}

function judgeField(spot: Extract<Spot, { at: 'field' | 'lane' }>, content: Y.Item['content']): void {
  if (!(content instanceof Y.ContentAny)) refuse('outside-layout', 'A field holds one plain value.')
  if (content.arr.length !== 1) refuse('outside-layout', 'A field holds one value.')
  judgeValue(spot, content.arr[0])
}

function judgeContainer(content: Y.Item['content'], wanted: typeof Y.Map | typeof Y.Text, words: string): void {
  if (content instanceof Y.ContentType && content.type.constructor === wanted) return
  refuse('outside-layout', `${words} and nothing else.`)
}

function judgeValue(spot: Extract<Spot, { at: 'field' | 'lane' }>, value: unknown): void {
  if (!isScalar(value)) refuse('bad-value', 'A field holds a text, a number, yes or no, or nothing.')
  if (typeof value === 'number' && (!Number.isFinite(value) || Object.is(value, -0)))
    refuse('bad-value', 'A number is finite and not minus zero.')
  if (typeof value === 'string') judgeText(value)
  const reason =
    spot.at === 'lane' ? refuseValue('laneValues', spot.key, value) : refuseValue(spot.section, spot.field, value)
  if (reason !== null) refuse('bad-value', reason)
}

function judgeText(text: string): void {
  if (LONE_SURROGATE.test(text)) refuse('bad-value', 'The text has half of a character pair in it.')
}

function isScalar(value: unknown): value is string | number | boolean | null {
  return value === null || typeof value === 'string' || typeof value === 'number' || typeof value === 'boolean'
}
