import { main } from './main'

// A reader that has seen enough, such as 'head', closes the pipe: no reason for a trace.
process.stdout.on('error', (error: NodeJS.ErrnoException) => {
  if (error.code !== 'EPIPE') throw error
})

// The status is set and not forced, so that a long answer reaches a slow pipe whole.
process.exitCode = await main(process.argv.slice(2), process)
