import { evaluateCommand } from './evaluate'
import { type Command, type CommandIo, INVALID } from './io'

const COMMANDS: ReadonlyMap<string, Command> = new Map([['evaluate', evaluateCommand]])

const USAGE = [
  'Usage: halfbaud COMMAND',
  '',
  ...[...COMMANDS.values()].map((command) => command.usage),
  '  help                Prints this.',
  '',
].join('\n')

/**
 * The command line, without a server.
 * @param argv the words after the program's name
 * @returns the exit status; what it means is in the usage text
 */
export async function main(argv: readonly string[], io: CommandIo): Promise<number> {
  const [name, ...words] = argv
  if (name === 'help' || name === '--help' || name === '-h') {
    io.stdout.write(USAGE)
    return 0
  }
  const command = name === undefined ? undefined : COMMANDS.get(name)
  if (command === undefined) {
    const complaint = name === undefined ? 'Name a command.' : `'${name}' is not a command.`
    io.stderr.write(`${complaint}\n${USAGE}`)
    return INVALID
  }
  return command.run(words, io)
}
