import { Prisma } from '../generated/client'

type Kind = 'person' | 'budget' | 'token' | 'catalogue entry'

/** What the call names is not in the records. */
export class NotRecorded extends Error {
  constructor(kind: Kind, id: string) {
    super(`There is no ${kind} ${id} in the records.`)
    this.name = 'NotRecorded'
  }
}

/** What the call makes is in the records already; nothing was changed. */
export class AlreadyRecorded extends Error {
  constructor(kind: Kind, id: string) {
    super(`The ${kind} ${id} is in the records already; nothing was changed.`)
    this.name = 'AlreadyRecorded'
  }
}

/** Says in our own words what a key refused, so that no type of the client leaves lib/records. */
export function refusedKey(kind: Kind, id: string): (cause: unknown) => never {
  return (cause) => {
    if (cause instanceof Prisma.PrismaClientKnownRequestError) {
      if (cause.code === 'P2002') throw new AlreadyRecorded(kind, id)
      if (cause.code === 'P2003') throw new NotRecorded(kind, id)
    }
    throw cause
  }
}
