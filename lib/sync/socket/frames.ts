import * as decoding from 'lib0/decoding'
import * as encoding from 'lib0/encoding'
import * as Y from 'yjs'
import { z } from 'zod'
import { type Cell, decodeBody, type EditHeader, MESSAGE } from '../../sheet/wire'
import { MAX_ID } from '../gate/decode'
import { EDIT_ID } from '../room/editKey'

/** What a connection may say. Everything else of y-websocket's protocol is read over: it has no say here. */
export type Said =
  | { readonly is: 'asks'; readonly stateVector: Uint8Array }
  | { readonly is: 'edit'; readonly header: EditHeader; readonly update: Uint8Array }
  /** An edit that cannot be judged but answered. */
  | { readonly is: 'bad edit'; readonly editId: string }
  | { readonly is: 'hello'; readonly header: unknown }
  | { readonly is: 'cell'; readonly cell: Cell | null }
  | { readonly is: 'nothing' }

const MOST_CELL = 1024
const SYNC = 0
const SYNC_STEP_1 = 0

const editHeader: z.ZodType<EditHeader> = z.strictObject({
  editId: z.string().regex(EDIT_ID),
  epoch: z.number().int(),
  clientId: z.number().int().min(0).max(MAX_ID),
})
const answerable = z.object({ editId: z.string().min(1).max(100) })
const word = z.string().max(80)
const cell: z.ZodType<Cell | null> = z
  .strictObject({ section: word, id: word.nullable(), field: word.nullable() })
  .nullable()

/** Reads one frame. @returns null where it cannot be read */
export function readable(frame: Uint8Array): Said | null {
  try {
    return readFrame(frame)
  } catch {
    return null
  }
}

function readFrame(frame: Uint8Array): Said {
  const decoder = decoding.createDecoder(frame)
  const type = decoding.readVarUint(decoder)
  if (type === SYNC) {
    if (decoding.readVarUint(decoder) !== SYNC_STEP_1) return { is: 'nothing' }
    const stateVector = decoding.readVarUint8Array(decoder)
    Y.decodeStateVector(stateVector)
    return { is: 'asks', stateVector }
  }
  if (type === MESSAGE.hello) return { is: 'hello', header: decodeBody(type, decoder).header }
  if (type === MESSAGE.edit) return readEdit(decoder)
  if (type === MESSAGE.cell && frame.length <= MOST_CELL) {
    const read = cell.safeParse(decodeBody(type, decoder).header)
    return read.success ? { is: 'cell', cell: read.data } : { is: 'nothing' }
  }
  return { is: 'nothing' }
}

/** The answer to SyncStep1. */
export function syncStep2(update: Uint8Array): Uint8Array {
  const encoder = encoding.createEncoder()
  encoding.writeVarUint(encoder, SYNC)
  encoding.writeVarUint(encoder, 1)
  encoding.writeVarUint8Array(encoder, update)
  return encoding.toUint8Array(encoder)
}

function readEdit(decoder: decoding.Decoder): Said {
  const { header, update } = decodeBody(MESSAGE.edit, decoder)
  const read = editHeader.safeParse(header)
  // A copy: the frame's memory is the socket's.
  if (read.success && update) return { is: 'edit', header: read.data, update: update.slice() }
  const { editId } = answerable.parse(header)
  return { is: 'bad edit', editId }
}
