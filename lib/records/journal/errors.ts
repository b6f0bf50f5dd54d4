/** The disk or the driver failed: nothing of the call was stored. `cause` is the driver's error. */
export class JournalWriteFailed extends Error {
  constructor(cause: Error) {
    super(`The journal could not be written, nothing was stored; check free space and permissions. ${cause.message}`, {
      cause,
    })
    this.name = 'JournalWriteFailed'
  }
}

/** A row does not follow the rows before it, or an edit id is there already: nothing of the call was stored. */
export class JournalRefused extends Error {
  constructor(cause: Error) {
    super(`The journal refused the rows, nothing was stored; read the head again and seal anew. ${cause.message}`, {
      cause,
    })
    this.name = 'JournalRefused'
  }
}

/** More rows than one INSERT takes; a commit is never split, so the caller commits fewer rows at a time. */
export class TooManyRows extends Error {
  constructor(rows: number, limit: number) {
    super(`${rows} rows are too many for one commit; commit at most ${limit} at a time.`)
    this.name = 'TooManyRows'
  }
}

/** The file cannot serve as a journal: wrong version, changed triggers, or settings that do not hold. */
export class JournalUnusable extends Error {
  constructor(reason: string) {
    super(reason)
    this.name = 'JournalUnusable'
  }
}
