/** Ends the reading of a file; readTouchstone turns it into a problem. */
export class Unreadable extends Error {
  constructor(
    readonly line: number | null,
    message: string,
  ) {
    super(message)
  }
}
