import { expect, it } from 'vitest'
import { fuzzIntake } from '../support/fuzzIntake'

it('[W4.5] the shadow equals live plus what is accepted (seeds 1000 to 1299)', () => {
  const counts = fuzzIntake(1000, 1299)
  console.log(counts)
  expect(counts.failures).toBeGreaterThan(100)
})
