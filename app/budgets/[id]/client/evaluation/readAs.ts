import type { NeededFile } from '../../../../../lib/budget/evidence/needed'

/** What decides the network in a file: its content, and the ending of its name, which says how many ports it has. */
export function readAs({ sha256, name }: NeededFile): string {
  return `${sha256} ${name.slice(name.lastIndexOf('.')).toLowerCase()}`
}
