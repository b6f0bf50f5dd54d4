import * as encoding from 'lib0/encoding'

type Id = { client: number; clock: number }
export type ForgedItem = {
  origin?: Id
  rightOrigin?: Id
  parent?: string | Id
  key?: string
  /** Content reference of Yjs' update format, version 1. */
  ref: number
  write: (encoder: encoding.Encoder) => void
}
export type ForgedBlock = { client: number; clock: number; structs: (ForgedItem | { gc: number } | { skip: number })[] }

/** An update written byte by byte (Yjs' format, version 1: read in its source), for what no Yjs document would send. */
export function forge(blocks: ForgedBlock[], deletes: Record<number, [clock: number, len: number][]> = {}): Uint8Array {
  const encoder = encoding.createEncoder()
  encoding.writeVarUint(encoder, blocks.length)
  for (const { client, clock, structs } of blocks) {
    encoding.writeVarUint(encoder, structs.length)
    encoding.writeVarUint(encoder, client)
    encoding.writeVarUint(encoder, clock)
    for (const struct of structs) writeStruct(encoder, struct)
  }
  const clients = Object.entries(deletes)
  encoding.writeVarUint(encoder, clients.length)
  for (const [client, ranges] of clients) {
    encoding.writeVarUint(encoder, Number(client))
    encoding.writeVarUint(encoder, ranges.length)
    for (const [clock, len] of ranges) {
      encoding.writeVarUint(encoder, clock)
      encoding.writeVarUint(encoder, len)
    }
  }
  return encoding.toUint8Array(encoder)
}

export const deleted = (len: number): Pick<ForgedItem, 'ref' | 'write'> => ({
  ref: 1,
  write: (encoder) => encoding.writeVarUint(encoder, len),
})
export const any = (...values: unknown[]): Pick<ForgedItem, 'ref' | 'write'> => ({
  ref: 8,
  write: (encoder) => {
    encoding.writeVarUint(encoder, values.length)
    for (const value of values) encoding.writeAny(encoder, value as never)
  },
})
export const string = (text: string): Pick<ForgedItem, 'ref' | 'write'> => ({
  ref: 4,
  write: (encoder) => encoding.writeVarString(encoder, text),
})
/** 0 list, 1 map, 2 text, 4 fragment, 6 XML text. */
export const type = (kind: number): Pick<ForgedItem, 'ref' | 'write'> => ({
  ref: 7,
  write: (encoder) => encoding.writeVarUint(encoder, kind),
})
export const binary = (bytes: Uint8Array): Pick<ForgedItem, 'ref' | 'write'> => ({
  ref: 3,
  write: (encoder) => encoding.writeVarUint8Array(encoder, bytes),
})
export const subdocument = (guid: string): Pick<ForgedItem, 'ref' | 'write'> => ({
  ref: 9,
  write: (encoder) => {
    encoding.writeVarString(encoder, guid)
    encoding.writeAny(encoder, {})
  },
})

function writeStruct(encoder: encoding.Encoder, struct: ForgedBlock['structs'][number]): void {
  if ('gc' in struct) {
    encoding.writeUint8(encoder, 0)
    encoding.writeVarUint(encoder, struct.gc)
    return
  }
  if ('skip' in struct) {
    encoding.writeUint8(encoder, 10)
    encoding.writeVarUint(encoder, struct.skip)
    return
  }
  const { origin, rightOrigin, parent, key, ref, write } = struct
  const info = ref | (origin ? 128 : 0) | (rightOrigin ? 64 : 0) | (key === undefined ? 0 : 32)
  encoding.writeUint8(encoder, info)
  for (const id of [origin, rightOrigin]) if (id) writeId(encoder, id)
  if (!origin && !rightOrigin) {
    encoding.writeVarUint(encoder, typeof parent === 'string' ? 1 : 0)
    if (typeof parent === 'string') encoding.writeVarString(encoder, parent)
    else if (parent) writeId(encoder, parent)
    if (key !== undefined) encoding.writeVarString(encoder, key)
  }
  write(encoder)
}

function writeId(encoder: encoding.Encoder, { client, clock }: Id): void {
  encoding.writeVarUint(encoder, client)
  encoding.writeVarUint(encoder, clock)
}
