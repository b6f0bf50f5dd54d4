import { execFile } from 'node:child_process'
import { readFile } from 'node:fs/promises'
import { join } from 'node:path'
import { fileURLToPath } from 'node:url'
import { promisify } from 'node:util'
import { expect, test } from 'vitest'
import { temporaryDirectory } from './temporary'

const run = promisify(execFile)
const COMMITS = 40

type Event = 'write' | 'sync' | 'acknowledged'

/**
 * Reads `strace -f -y`: writes to the journal's log count from their beginning, syncs of it once they have returned 0,
 * acknowledgements from their beginning. Calls that other threads interrupt are put together again by process id.
 */
function eventsOf(trace: string): Event[] {
  const events: Event[] = []
  const syncing = new Set<string>()
  for (const line of trace.split('\n')) {
    const [, pid = '', call = ''] = /^(\d+)\s+(.*)$/.exec(line) ?? []
    if (/^pwrite64\(\d+<[^>]*journal\.sqlite-wal>/.test(call)) events.push('write')
    else if (/^write\(1<.*"acknowledged /.test(call)) events.push('acknowledged')
    else if (/^(fsync|fdatasync)\(\d+<[^>]*journal\.sqlite-wal>/.test(call)) {
      if (call.includes('<unfinished')) syncing.add(pid)
      else if (call.endsWith('= 0')) events.push('sync')
    } else if (/^<\.\.\. (fsync|fdatasync) resumed>/.test(call) && syncing.delete(pid)) {
      if (call.endsWith('= 0')) events.push('sync')
    }
  }
  return events
}

/** @returns for each acknowledgement, whether the log had been written and then synced since the one before */
async function traced(level: 'FULL' | 'NORMAL'): Promise<boolean[]> {
  const directory = await temporaryDirectory()
  const trace = join(directory, 'trace')
  const child = fileURLToPath(new URL('./syncs.child.ts', import.meta.url))
  const node = [process.execPath, '--import', 'tsx', child, join(directory, 'journal.sqlite'), String(COMMITS), level]
  // Without strace this throws ENOENT: install it; a check that cannot run has not passed.
  await run('strace', ['-f', '-y', '-s', '40', '-e', 'trace=write,pwrite64,fsync,fdatasync', '-o', trace, ...node])

  const synced: boolean[] = []
  let state: 'idle' | 'written' | 'synced' = 'idle'
  for (const kind of eventsOf(await readFile(trace, 'utf8'))) {
    if (kind === 'write') state = 'written'
    else if (kind === 'sync' && state === 'written') state = 'synced'
    else if (kind === 'acknowledged') {
      synced.push(state === 'synced')
      state = 'idle'
    }
  }
  return synced
}

test('[W5.8] strace: between the write of each commit and its acknowledgement the log is synced', async () => {
  expect(await traced('FULL')).toEqual(Array(COMMITS).fill(true))
})

test('the control: with synchronous=NORMAL the same trace shows that syncs are missing', async () => {
  const synced = await traced('NORMAL')
  expect(synced).toHaveLength(COMMITS)
  expect(synced.filter(Boolean).length).toBeLessThan(3)
})
