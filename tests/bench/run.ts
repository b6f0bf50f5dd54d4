import { benchBuilds } from './builds.bench'
import { benchCascade } from './cascade.bench'
import { benchEvaluate } from './evaluate.bench'
import { benchSweep } from './sweep.bench'
import { benchTouchstone } from './touchstone.bench'
import { benchWritePath } from './writePath.bench'

/** One run, one table: each figure beside its baseline, measured in this same process. Nothing is asserted. */
const rows = [
  ...(await benchEvaluate()),
  ...(await benchSweep()),
  ...(await benchCascade()),
  ...(await benchTouchstone()),
  ...(await benchBuilds()),
  ...(await benchWritePath()),
]
const width = Math.max(...rows.map((row) => row.what.length))
for (const { what, ours, baseline, unit } of rows) {
  const ratio = (ours / baseline).toFixed(2)
  console.log(
    `${what.padEnd(width)}  ${ours.toFixed(3)} ${unit}, baseline ${baseline.toFixed(3)} ${unit}, ratio ${ratio}`,
  )
}
process.exit(0)
