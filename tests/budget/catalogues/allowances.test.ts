import { describe, expect, it } from 'vitest'
import {
  type AllowanceEntry,
  allowanceEntry,
  allowanceFromCatalogue,
  OWN_COPY_WINS,
  PUBLISHED_ALLOWANCES,
} from '../../../lib/budget/catalogues/allowances'
import { evaluate } from '../../../lib/budget/evaluate'
import { FREQUENCY, LOSS, typedValue } from '../../../lib/budget/quantities'
import { PLANE_CODES } from '../../../lib/budget/schema'
import { signallingOf } from '../../../lib/budget/signalling'
import { limitAt, parseCurve } from '../../../lib/channel/limits'
import { line, link } from '../links'

const ids = PUBLISHED_ALLOWANCES.map(({ id }) => id)
const each = PUBLISHED_ALLOWANCES.map((entry) => [entry.id, entry] as const)
const withCurve = each.filter(([, { curve }]) => curve !== null)
const withSplit = each.filter(([, { split }]) => split.length > 0)

const entry = (id: string) => {
  const found = PUBLISHED_ALLOWANCES.find((one) => one.id === id)
  if (!found) throw new Error(`no entry ${id}`)
  return found
}
const curveOf = ({ curve }: AllowanceEntry) => {
  const parsed = parseCurve(curve ?? '')
  if ('reason' in parsed) throw new Error(parsed.reason)
  return parsed
}
const db = (text: string | null) => typedValue(LOSS, text) ?? Number.NaN
const hz = (text: string | null) => typedValue(FREQUENCY, text) ?? Number.NaN

/** Figures: published standards as each entry's confidence says; what is checked is that they agree with each other. */
describe('the published allowances', () => {
  it.each(each)('%s fits the schema of an entry', (_, { id: _id, ...fields }) => {
    expect(allowanceEntry.parse(fields)).toEqual(fields)
  })

  it('have ids of their own, a body, a clause, a confidence, a frequency and two different planes', () => {
    expect(new Set(ids).size).toBe(ids.length)
    for (const [, one] of each) {
      for (const said of [one.name, one.body, one.clause, one.status]) expect(said?.trim()).toBeTruthy()
      expect(one.confidence).toMatch(/^(read|two-sources|from-memory)$/)
      expect(PLANE_CODES).toContain(one.publishedFrom)
      expect(PLANE_CODES).toContain(one.publishedTo)
      expect(one.publishedFrom).not.toBe(one.publishedTo)
      expect(hz(one.at)).toBeGreaterThan(0)
    }
  })

  it('show no address of a web page', () => {
    expect(JSON.stringify(PUBLISHED_ALLOWANCES)).not.toMatch(/https?:|www\.|\.(com|org|net|html)\b/)
  })

  it.each(each)(
    '%s: Nyquist frequency = rate / (2 · bits per symbol)',
    (_, { bitRate, code, codedBits, codedSymbols, nyquist }) => {
      const head = { ...link({}).head, bitRate, rateType: 'line' as const, code, codedBits, codedSymbols }
      const computed = signallingOf(link({ head }).head).evaluation.nyquist
      expect(computed).not.toBe(null)
      expect(Math.abs((computed ?? 0) / hz(nyquist) - 1)).toBeLessThan(1e-9)
    },
  )

  it.each(each)('%s stands at its Nyquist frequency, or says that it does not', (_, { nyquist, at, caution }) => {
    if (at !== nyquist) expect(caution).toContain('not the Nyquist frequency')
  })

  it.each(withCurve)('%s: its curve gives its limit within 1 % (10GBASE-KR is 0.19 dB off 25 dB)', (_, one) => {
    const limit = limitAt(curveOf(one), hz(one.at))
    expect(Math.abs((limit ?? 0) - db(one.limit))).toBeLessThan(0.01 * db(one.limit))
  })

  it.each(withCurve)('%s: its curve is from memory and says so', (_, { caution }) => {
    expect(caution).toContain('The curve is from memory.')
  })

  it.each(withCurve)('%s: the pieces of its curve meet within 0.05 dB (IEEE 802.3, from memory)', (_, one) => {
    const { pieces } = curveOf(one)
    for (const [i, { toHz }] of pieces.slice(0, -1).entries()) {
      const [below, above] = [limitAt(curveOf(one), toHz * (1 - 1e-8)), limitAt(curveOf(one), toHz * (1 + 1e-8))]
      expect(pieces[i + 1]?.fromHz).toBe(toHz)
      expect(Math.abs((below ?? 0) - (above ?? 9))).toBeLessThan(0.05)
    }
  })

  it.each(withSplit)('%s: its split closes, overlaps subtracted once', (_, { split, limit }) => {
    const sum = split.reduce((total, { loss, overlap }) => total + (overlap === true ? -1 : 1) * db(loss), 0)
    expect(sum).toBeCloseTo(db(limit), 9)
    for (const { loss } of split) expect(db(loss)).toBeGreaterThan(0)
  })

  it.each([
    ['ieee-100g-cr4-host', 'it ends before the connector of the host, where no plane of the list is'],
    ['picmg-come-pcie-5', 'its figure leaves out the connector that lies between its planes'],
    ['sas-1.1-tctf', 'its compliance points IT or CT to IR or CR are none of the planes'],
    ['sata-cable', 'its ends lie outside the mated connectors, where no plane of the list is'],
  ])('%s is left out: %s', (id) => {
    expect(ids).not.toContain(id)
  })

  it('carry no limit where none is published as one figure', () => {
    expect(each.filter(([, { limit }]) => limit === null).map(([id]) => id)).toEqual(['pcie-5'])
  })
})

describe('limit curves of the catalogue, computed from the coefficients of their clauses', () => {
  const nepers = 20 * Math.log10(Math.E)
  const at = (id: string, ghz: number) => limitAt(curveOf(entry(id)), ghz * 1e9)

  it.each([0.05, 1, 5.15625, 9, 15])('Annex 69B at %d GHz (from memory)', (f) => {
    const hertz = f * 1e9
    const amax = nepers * (2e-5 * Math.sqrt(hertz) + 1.1e-10 * hertz + 3.2e-20 * hertz ** 2 - 1.2e-30 * hertz ** 3)
    const outOfBand = f > 6 ? 1e-8 * (hertz - 6e9) : 0
    expect(at('ieee-10g-kr', f)).toBeCloseTo(amax + 0.8 + 2e-10 * hertz + outOfBand, 4)
    if (f <= 2) expect(at('ieee-10g-kx4', f)).toBeCloseTo(amax + 0.8 + 2e-10 * hertz, 4)
  })

  it.each([0.1, 0.75, 1.5])('Clause 47 at %d GHz (from memory); 5.4 dB at 1.5 GHz was read elsewhere', (f) => {
    const hertz = f * 1e9
    expect(at('ieee-xaui', f)).toBeCloseTo(
      nepers * (6.5e-6 * Math.sqrt(hertz) + 2e-10 * hertz + 3.3e-20 * hertz ** 2),
      5,
    )
    if (f === 1.5) expect(at('ieee-xaui', f)).toBeCloseTo(5.4, 1)
  })

  it.each([0.1, 1.5625, 2])('Clause 54 at %d GHz (from memory)', (f) => {
    const mhz = f * 1e3
    expect(at('ieee-10g-cx4', f)).toBeCloseTo(0.2629 * Math.sqrt(mhz) + 0.0034 * mhz + 12.76 / Math.sqrt(mhz) + 0.5, 5)
  })

  it.each([0.01, 5, 13])('Annex 83E at %d GHz: 1.076 times that of CEI-28G-VSR (from memory)', (f) => {
    const bracket = 0.075 + 0.537 * Math.sqrt(f) + 0.566 * f
    expect(at('ieee-caui4-c2m', f)).toBeCloseTo(1.076 * bracket, 6)
    expect(at('ieee-50gaui-c2m', f)).toBeCloseTo(1.076 * bracket, 6)
    if (f > 0.05) expect(at('oif-28g-vsr', f)).toBeCloseTo(bracket, 9)
  })

  it('Annex 83E above 14 GHz: 1.076 (2 f − 18) (from memory)', () => {
    expect(at('ieee-caui4-c2m', 18)).toBeCloseTo(1.076 * 18, 9)
  })

  it('Clause 93: 35.0 dB at fb/2 and 82.7 dB at fb (from memory)', () => {
    expect(at('ieee-100g-kr4', 12.890625)).toBeCloseTo(-12.71 + 3.7 * 12.890625, 9)
    expect(at('ieee-100g-kr4', 25.78125)).toBeCloseTo(82.68, 2)
  })
})

describe('an allowance taken from the catalogue', () => {
  const planes = (...codes: (string | null)[]) =>
    Object.fromEntries(codes.map((code, i) => [`p${i}`, { order: `a${i}`, code: code as 'tp1' }]))

  it('fills the fields of a record and finds the planes by their codes', () => {
    const budget = link({ planes: planes('tp0', 'tp1', 'tp4', 'tp5') })
    expect(allowanceFromCatalogue(entry('ieee-40g-cr4'), budget)).toMatchObject({
      name: '40GBASE-CR4, 100GBASE-CR10 cable assembly',
      limit: '17.04 dB',
      at: '5.15625 GHz',
      publishedFrom: 'tp1',
      publishedTo: 'tp4',
      from: 'p1',
      to: 'p2',
      body: 'IEEE 802.3',
      clause: '802.3ba Clause 85',
      confidence: 'read',
      curve: null,
    })
  })

  it('keeps the caution and says that the own copy wins', () => {
    const { note } = allowanceFromCatalogue(entry('oif-56g-lr'), link({}))
    expect(note).toBe(
      `Published as: informative. At the start of the project about 35 dB at 14 GHz was named. ${OWN_COPY_WINS}`,
    )
  })

  it('leaves a plane open that the budget does not have, and one that lies the wrong way round', () => {
    expect(allowanceFromCatalogue(entry('ieee-100g-kr4'), link({ planes: planes('tp0', null) }))).toMatchObject({
      from: 'p0',
      to: null,
      publishedTo: 'tp5',
    })
    expect(allowanceFromCatalogue(entry('ieee-100g-kr4'), link({ planes: planes('tp5', 'tp0') }))).toMatchObject({
      from: 'p1',
      to: null,
    })
  })

  it('is taken mirrored only where it is published both ways and only then fits', () => {
    const back = link({ planes: planes('module-ball', 'rx-ball') })
    expect(allowanceFromCatalogue(entry('ieee-caui4-c2m'), back)).toMatchObject({
      publishedFrom: 'module-ball',
      publishedTo: 'rx-ball',
      from: 'p0',
      to: 'p1',
    })
    const forth = link({ planes: planes('tx-ball', 'module-ball') })
    expect(allowanceFromCatalogue(entry('ieee-caui4-c2m'), forth)).toMatchObject({ publishedFrom: 'tx-ball', to: 'p1' })
    expect(allowanceFromCatalogue({ ...entry('ieee-caui4-c2m'), eitherWay: null }, back)).toMatchObject({
      publishedFrom: 'tx-ball',
      from: null,
      to: 'p0',
    })
  })

  it('is taken between the outermost planes where both have one code', () => {
    const faces = link({ planes: planes('connector-face', 'connector-face', 'connector-face') })
    const cable = { ...entry('ieee-40g-cr4'), publishedFrom: 'connector-face', publishedTo: 'connector-face' } as const
    expect(allowanceFromCatalogue(cable, faces)).toMatchObject({ from: 'p0', to: 'p2' })
    const one = link({ planes: planes('connector-face') })
    expect(allowanceFromCatalogue(cable, one)).toMatchObject({ from: 'p0', to: null })
  })

  it('is judged between those planes (by hand: 7.3 of 10 dB used)', () => {
    const parts = {
      planes: planes('tx-ball', 'module-ball'),
      lines: { host: line('a0V', '7.3 dB', { at: '12.890625 GHz' }) },
    }
    const taken = allowanceFromCatalogue(entry('ieee-caui4-c2m'), link(parts))
    const { allowances } = evaluate(link({ ...parts, allowances: { taken: { order: 'a0', ...taken } } }), new Map())
    expect(allowances[0]).toMatchObject({ limitDb: 10, atHz: 12.890625e9, marginDb: expect.closeTo(2.7, 9) })
  })
})
