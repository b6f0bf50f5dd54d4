import { describe, expect, it } from 'vitest'
import { drawBuilds } from '../../lib/budget/builds'
import { normalCdf } from '../../lib/channel/statistics/normal'
import { buildLine } from '../budget/builds/lines'
import { byHand, type Row } from './byHand'

/** Ball to ball, 28 dB: the printed table of practice.md C1. Traces grow by 0.12 %/K over 40 K when hot. */
const TABLE: readonly Row[] = [
  ['BGA via, line card', 0.6, 0.15, 'card-via-bga'],
  ['line-card stripline', 4.75, 0.285, 'card'],
  ['press-fit footprint via', 0.45, 0.12, 'card-via-conn'],
  ['backplane connector, near', 1.35, 0.2, 'conn'],
  ['backplane via, near', 0.65, 0.15, 'bp-via'],
  ['backplane stripline', 9.2, 0.552, 'bp'],
  ['backplane via, far', 0.65, 0.15, 'bp-via'],
  ['backplane connector, far', 1.35, 0.2, 'conn'],
  ['press-fit footprint via, far', 0.45, 0.12, 'card-via-conn'],
  ['switch-card stripline', 6.65, 0.399, 'card'],
  ['AC capacitor', 0.5, 0.1, ''],
  ['BGA via, switch card', 0.6, 0.15, 'card-via-bga'],
]
const LIMIT = 28
const TRIALS = 100_000
const SEED = 1

const hot = TABLE.map(([name, db, plusMinus, group]): Row => {
  const grown = name.includes('stripline') ? 1.048 : 1
  return [name, db * grown, plusMinus * grown, group]
})
const apart = TABLE.map(([name, db, plusMinus]): Row => [name, db, plusMinus, ''])

const draw = (rows: readonly Row[], lanes = 1) =>
  drawBuilds({
    lines: rows.map(([id, nominalDb, t, group]) =>
      buildLine(id, { nominalDb, minusDb: t, plusDb: t, group: group === '' ? id : group }),
    ),
    lanes,
    limitDb: LIMIT,
    trials: TRIALS,
    seed: SEED,
  })

/** The share of a normal distribution under the limit, with the printed figures added by hand. */
function analytic(rows: readonly Row[]) {
  const { total, grouped } = byHand(rows)
  return { total, sigma: grouped / 3, inside: normalCdf((LIMIT - total) / (grouped / 3)) }
}

describe(`Tamarack in one lane, ${TRIALS} builds with seed ${SEED} (practice.md C1, checked by the normal distribution)`, () => {
  it.each([
    ['at 25 °C: mean 27.20 dB, ±1.09 dB, 98.6 % inside', TABLE, 27.2, 1.09, 0.986],
    ['hot: 28.19 dB, about 30 % inside', hot, 28.19, null, 0.3],
    ['with nothing in common: ±0.87 dB', apart, 27.2, 0.87, null],
  ] as const)('%s', (_, rows, printedTotal, printedRss, printedInside) => {
    const { total, sigma, inside } = analytic(rows)
    expect(total).toBeCloseTo(printedTotal, 2)
    if (printedRss !== null) expect(3 * sigma).toBeCloseTo(printedRss, 2)
    if (printedInside !== null) expect(inside).toBeCloseTo(printedInside, printedInside > 0.9 ? 3 : 1)
    const builds = draw(rows)
    expect(Math.abs((builds.meanDb ?? 0) - total)).toBeLessThan((4 * sigma) / Math.sqrt(TRIALS))
    const deviation = Math.sqrt((inside * (1 - inside)) / TRIALS)
    expect(Math.abs((builds.fractionInside?.value ?? 0) - inside)).toBeLessThan(4 * deviation)
    for (const [share, z] of [
      ['p50', 0],
      ['p90', 1.2815515655446004],
      ['p95', 1.6448536269514722],
      ['p99', 2.3263478740408408],
      ['p99_7', 2.7477813854449926],
    ] as const) {
      const { db, error } = builds.percentiles[share] ?? { db: Number.NaN, error: 0 }
      expect(Math.abs(db - total - z * sigma)).toBeLessThan(4 * error)
    }
  })

  it('worst case: 29.78 dB, which no build of a hundred thousand reaches', () => {
    expect(byHand(TABLE).worst).toBeCloseTo(29.78, 2)
    const lines = TABLE.map(([id, nominalDb, t, group]) =>
      buildLine(id, { nominalDb, minusDb: t, plusDb: t, group: group || id }),
    )
    const builds = drawBuilds({ lines, lanes: 1, limitDb: 29.78, trials: TRIALS, seed: SEED })
    expect(builds.fractionInside?.value).toBe(1)
  })

  it('all 16 lanes of a build: fewer than one lane, as only the capacitor varies from lane to lane', () => {
    const { inside } = analytic(TABLE)
    const builds = draw(TABLE, 16)
    expect(builds.independent).toEqual(['AC capacitor'])
    expect(builds.common).toEqual(['card-via-bga', 'card', 'card-via-conn', 'conn', 'bp-via', 'bp'])
    // What is common is normal, and each lane's capacitor on top: integrated over the common part.
    const common = byHand(TABLE.filter(([, , , group]) => group !== '')).grouped / 3
    let all = 0
    for (let z = -8; z < 8; z += 1 / 256) {
      const density = Math.exp(-0.5 * z * z) / Math.sqrt(2 * Math.PI)
      all += (density * normalCdf((LIMIT - 27.2 - common * z) / (0.1 / 3)) ** 16) / 256
    }
    expect(all).toBeLessThan(inside)
    const deviation = Math.sqrt((all * (1 - all)) / TRIALS)
    expect(Math.abs((builds.fractionInside?.value ?? 0) - all)).toBeLessThan(4 * deviation)
  })
})
