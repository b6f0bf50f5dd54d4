import { readFileSync } from 'node:fs'
import { join } from 'node:path'

/**
 * Sums the runners' JSON reports. A runner that wrote none counts as one failure, so does each failed step that no report
 * explains, and so does each skipped test of the browser suite: skipped is not checked.
 */
const [folder, ...rest] = process.argv.slice(2)
const cut = rest.indexOf('--')
const suites = rest.slice(0, cut)
const failedSteps = rest.slice(cut + 1)

let passed = 0
let failed = 0
for (const suite of suites) {
  try {
    const report = JSON.parse(readFileSync(join(folder, `${suite}.json`), 'utf8'))
    passed += report.numPassedTests
    failed += report.numFailedTests
    const files = report.testResults.filter(
      (file) => file.status === 'failed' && !file.assertionResults.some((test) => test.status === 'failed'),
    )
    failed += files.length
    const skipped = report.numPendingTests + (report.numTodoTests ?? 0)
    if (suite === 'web') failed += skipped + (report.numPassedTests === 0 ? 1 : 0)
    if (skipped > 0) console.log(`${suite}: ${skipped} skipped`)
  } catch (error) {
    console.log(`${suite}: no report (${error.message})`)
    failed += 1
  }
}
const explained = failed > 0 ? ['test', 'test:web'] : []
failed += failedSteps.filter((step) => !explained.includes(step)).length
if (failedSteps.length > 0) console.log(`failed steps: ${failedSteps.join(', ')}`)
console.log(`${passed} passed, ${failed} failed`)
process.exit(failed === 0 ? 0 : 1)
