import { dirname } from 'node:path'
import { evaluate, WHOLE } from '../../budget/evaluate'
import { readJson } from '../../budget/jsonText'
import { parseBudget } from '../../budget/parse'
import type { Verdict } from '../../budget/schema'
import { evidenceBeside } from './evidenceBeside'
import { type Command, type CommandIo, INVALID } from './io'
import { readText, UnreadableFile } from './readText'

const STATUS: Readonly<Record<Verdict, number>> = { inside: 0, over: 1, tight: 1, undecided: 2 }

const USAGE = `  evaluate FILE       Prints the evaluation of a budget file as JSON; - reads the standard input.
                      Evidence files are looked for in the same folder, by their SHA-256.
                      Exit status: 0 inside, 1 over or tight, 2 undecided, 3 invalid.`

/** 'halfbaud evaluate FILE': the evaluation on stdout, complaints on stderr, the verdict as exit status. */
export const evaluateCommand: Command = {
  usage: USAGE,
  async run(words, io) {
    const [file, ...others] = words
    if (file === undefined || others.length > 0 || (file.startsWith('-') && file !== '-')) {
      io.stderr.write(`Name one budget file, or - for the standard input.\nUsage:\n${USAGE}\n`)
      return INVALID
    }
    const called = file === '-' ? 'standard input' : file
    try {
      return await evaluateText(await readText(file, io.stdin), called, file === '-' ? '.' : dirname(file), io)
    } catch (error) {
      if (!(error instanceof UnreadableFile)) throw error
      io.stderr.write(`${called}: ${error.message}\n`)
      return INVALID
    }
  },
}

async function evaluateText(text: string, called: string, folder: string, io: CommandIo): Promise<number> {
  const read = readJson(text)
  if ('problem' in read) {
    const { line, column, message } = read.problem
    io.stderr.write(`${called}:${line}:${column}: This is not JSON. ${message}\n`)
    return INVALID
  }
  const parsed = parseBudget(read.value)
  if ('issues' in parsed) {
    for (const { message } of parsed.issues) io.stderr.write(`${called}: ${message}\n`)
    return INVALID
  }
  const evaluation = evaluate(parsed.budget, await evidenceBeside(parsed.budget, folder), WHOLE)
  io.stdout.write(`${JSON.stringify(evaluation, null, 2)}\n`)
  return STATUS[evaluation.verdict]
}
