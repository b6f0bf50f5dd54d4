import { createHash } from 'node:crypto'
import { existsSync, mkdirSync, readdirSync, readFileSync, statSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { ROOT } from './paths.mjs'

const FOLDER = join(ROOT, 'node_modules/.stamps')

/** A step is done again only when its inputs or its outputs have changed since it last succeeded. */
export function isFresh(step, inputs, outputs) {
  const file = join(FOLDER, step)
  return (
    outputs.every((output) => existsSync(join(ROOT, output))) &&
    existsSync(file) &&
    readFileSync(file, 'utf8') === fingerprint(inputs)
  )
}

export function stamp(step, inputs) {
  mkdirSync(FOLDER, { recursive: true })
  writeFileSync(join(FOLDER, step), fingerprint(inputs))
}

function fingerprint(inputs) {
  const hash = createHash('sha256').update(process.version)
  for (const input of inputs)
    for (const file of filesUnder(join(ROOT, input))) hash.update(file.slice(ROOT.length)).update(readFileSync(file))
  return hash.digest('hex')
}

function filesUnder(path) {
  if (!existsSync(path)) return []
  if (statSync(path).isFile()) return [path]
  return readdirSync(path)
    .filter((name) => name !== 'generated' && name !== 'node_modules')
    .sort()
    .flatMap((name) => filesUnder(join(path, name)))
}
