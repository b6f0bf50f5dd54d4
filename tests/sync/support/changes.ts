import type * as Y from 'yjs'
import { recordOf } from './sheet'

/** What the tests change most: the loss of a line. */
export const setLoss =
  (value: string, line = 'trace') =>
  (doc: Y.Doc): void => {
    recordOf(doc, 'lines', line).set('loss', value)
  }

export const lossOf = (doc: Y.Doc, line = 'trace'): unknown => recordOf(doc, 'lines', line).get('loss')
