import { openStore } from '../../lib/records/open'

/** Opens the store of the directory given, says so, and stays until it is killed. */
await openStore(process.argv[2] ?? '')
process.stdout.write('open\n')
setInterval(() => {}, 60_000)
