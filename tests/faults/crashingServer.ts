import { writeSync } from 'node:fs'
import { openStore } from '../../lib/records/open'
import { readConfig } from '../../lib/server/boot/config.mjs'
import { startServer } from '../../lib/server/start'

/**
 * The server without pages, as a process to be killed. With CRASH_AT_APPEND=n it kills itself (SIGKILL, nothing is flushed) a
 * moment after its n-th journal append has begun, if that append has not come back; it says so on its way out.
 */
const crashAt = Number(process.env.CRASH_AT_APPEND ?? 0)
const crashAfterMicroseconds = Number(process.env.CRASH_AFTER_US ?? 0)

await startServer(readConfig('serve', process.env, process.cwd()), process.cwd(), async (directory) => {
  const store = await openStore(directory)
  let appends = 0
  return {
    ...store,
    journal: new Proxy(store.journal, {
      get(journal, name) {
        if (name !== 'append') {
          const member = Reflect.get(journal, name)
          return typeof member === 'function' ? member.bind(journal) : member
        }
        return async (rows: Parameters<typeof journal.append>[0]) => {
          appends += 1
          let back = false
          const appended = journal.append(rows).finally(() => {
            back = true
          })
          if (appends === crashAt) {
            const begun = process.hrtime.bigint()
            while (process.hrtime.bigint() - begun < BigInt(crashAfterMicroseconds) * 1000n) {
              // The write goes on in SQLite's own thread while this one waits for its moment.
            }
            writeSync(1, back ? 'crash after an append\n' : 'crash during an append\n')
            process.kill(process.pid, 'SIGKILL')
          }
          return appended
        }
      },
    }),
  }
})
writeSync(1, 'ready\n')
