import { clockTime } from '../../../../words/client/readerTime'
import type { SheetState } from '../state/sheet'

export type Saved = {
  readonly title: string
  readonly detail: string
  /** still: all is well; waiting: something is on its way; stopped: a person must do something. */
  readonly tone: 'still' | 'waiting' | 'stopped'
}

type Facts = Pick<SheetState, 'connection' | 'unsaved' | 'lastAcknowledged' | 'role' | 'durable' | 'fault'>

/**
 * What the header says about saving, from facts alone: what is in the outbox, what was acknowledged, whether the line is
 * open. Nothing says saved until it is acknowledged.
 */
export function savedWords({ connection, unsaved, lastAcknowledged, role, durable, fault }: Facts): Saved {
  const waiting = `${unsaved} ${unsaved === 1 ? 'change' : 'changes'} not yet saved`
  const kept = durable ? `${waiting}, kept on this computer` : `${waiting}, kept only while this page is open`
  if (fault !== null)
    return { title: unsaved > 0 ? waiting : 'This browser keeps nothing', detail: fault, tone: 'stopped' }
  switch (connection.state) {
    case 'closed':
      return { title: unsaved > 0 ? kept : 'The connection is closed', detail: connection.words, tone: 'stopped' }
    case 'offline':
      return { title: unsaved > 0 ? kept : 'Offline', detail: connection.words, tone: 'waiting' }
    case 'connecting':
      return { title: unsaved > 0 ? kept : 'Connecting', detail: connection.words, tone: 'waiting' }
    case 'live':
      if (unsaved > 0) return { title: kept, detail: 'being sent', tone: 'waiting' }
      if (role === 'viewer') return { title: 'Up to date', detail: 'you may read this budget', tone: 'still' }
      return {
        title: 'Everything saved',
        detail:
          lastAcknowledged === null
            ? 'nothing changed here yet'
            : `last acknowledged ${clockTime(lastAcknowledged.time)}`,
        tone: 'still',
      }
  }
}
