import type { LineItem } from '../lineItem'
import { nameOf } from '../record'
import type { Check } from './check'

/** Bulk cable taken for a cable assembly: a run of cable lines that has a bulk and no ends. */
export const cableRuns: Check = function* ({ context }) {
  for (const run of runsOf(context.items)) {
    const bulk = run.find(({ line }) => covers(line.covers, 'bulk'))
    const allSaid = run.every(({ line }) => line.covers !== null)
    const ends = run.some(({ line }) => covers(line.covers, 'terminations') || covers(line.covers, 'paddle-cards'))
    if (!bulk || !allSaid || ends) continue
    yield {
      code: 'nobody-counts',
      section: 'lines',
      id: bulk.id,
      field: 'covers',
      message: `Nobody counts the wire terminations or paddle cards at the ends of ${nameOf('lines', bulk.id, bulk.line)}.`,
      todo: 'Add a line for each end, or take the loss of the cable assembly and say that it covers them.',
    }
  }
}

function runsOf(items: readonly LineItem[]): LineItem[][] {
  const runs: LineItem[][] = []
  const run: LineItem[] = []
  for (const item of items) {
    if (item.line.kind === 'reserve' || item.line.kind === 'overlap') continue
    if (item.line.kind === 'cable') run.push(item)
    else if (run.length > 0) runs.push(run.splice(0))
  }
  return run.length > 0 ? [...runs, run] : runs
}

function covers(codes: string | null, code: string): boolean {
  return codes?.split(' ').includes(code) ?? false
}
