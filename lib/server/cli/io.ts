/** What a command reads from and writes to; tests hand in their own. */
export type CommandIo = {
  readonly stdin: AsyncIterable<Uint8Array | string>
  readonly stdout: { write(text: string): unknown }
  readonly stderr: { write(text: string): unknown }
}

/** A command gets the words after its name. @returns the exit status. */
export type Command = {
  readonly usage: string
  run(words: readonly string[], io: CommandIo): Promise<number>
}

/** Exit status of everything that could not be done: wrong words, a missing or invalid file. */
export const INVALID = 3
