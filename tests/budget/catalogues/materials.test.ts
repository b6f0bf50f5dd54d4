import { describe, expect, it } from 'vitest'
import { FOIL_CLASSES, lineFromFoil } from '../../../lib/budget/catalogues/foils'
import { LAMINATE_CLASSES, laminateEntry, lineFromLaminate } from '../../../lib/budget/catalogues/laminates'
import { lineFromPackage, PUBLISHED_PACKAGES, packageEntry } from '../../../lib/budget/catalogues/packages'
import { LENGTH, NUMBER, typedValue } from '../../../lib/budget/quantities'
import { line } from '../../../lib/budget/schema/lines'

const number = (text: string | null) => typedValue(NUMBER, text) ?? Number.NaN
const micrometres = (text: string | null) => (typedValue(LENGTH, text) ?? Number.NaN) * 1e6
const fitsALine = (fields: object) => line.safeParse({ order: 'a0', ...fields }).success
const packageOf = (id: string) => {
  const found = PUBLISHED_PACKAGES.find((one) => one.id === id)
  if (!found) throw new Error(`no package ${id}`)
  return found
}

describe('laminate classes (from memory; common practice, no source)', () => {
  it.each(LAMINATE_CLASSES.map((one) => [one.id, one] as const))(
    '%s fits the schema of an entry and a line',
    (_, one) => {
      const { id: _id, ...fields } = one
      expect(laminateEntry.parse(fields)).toEqual(fields)
      expect(fitsALine(lineFromLaminate(one))).toBe(true)
    },
  )

  it('are estimates of ±25 % at 10 GHz, inside their ranges', () => {
    for (const one of LAMINATE_CLASSES) {
      expect(one).toMatchObject({ basis: 'estimate', tolerance: '25 %', anchor: '10 GHz', confidence: 'from-memory' })
      expect(one.caution).toContain('come from the fabricator')
      for (const [from, usual, to] of [
        [one.dkFrom, one.dk, one.dkTo],
        [one.dfFrom, one.df, one.dfTo],
      ]) {
        expect(number(usual ?? null)).toBeGreaterThan(number(from ?? null))
        expect(number(usual ?? null)).toBeLessThan(number(to ?? null))
      }
    }
  })

  it('lose less from class to class: 1.2, 0.7, 0.4, 0.2 and 0.1 dB/in of dielectric loss at 12.890625 GHz (from memory)', () => {
    // π f √Dk Df / c Np/m, the low-loss limit of a TEM wave in any handbook of transmission lines.
    const perInch = LAMINATE_CLASSES.map(({ dk, df }) => {
      const nepers = (Math.PI * 12.890625e9 * Math.sqrt(number(dk)) * number(df)) / 299792458
      return nepers * 20 * Math.log10(Math.E) * 0.0254
    })
    for (const [i, usual] of [1.22, 0.72, 0.37, 0.22, 0.1].entries()) {
      expect(perInch[i]).toBeGreaterThan(0.95 * usual)
      expect(perInch[i]).toBeLessThan(1.05 * usual)
    }
  })

  it('fill a line with values, basis and tolerance, and leave a tolerance that is not said alone', () => {
    const [standard] = LAMINATE_CLASSES
    if (!standard) throw new Error('no class')
    expect(lineFromLaminate(standard)).toEqual({
      dk: '4.2',
      df: '0.02',
      anchor: '10 GHz',
      method: null,
      resin: null,
      basis: 'estimate',
      toleranceMinus: '25 %',
      tolerancePlus: '25 %',
      toleranceMeaning: 'limit',
    })
    expect(lineFromLaminate({ ...standard, tolerance: null })).not.toHaveProperty('tolerancePlus')
  })
})

describe('foil classes (ranges in common use, some from memory)', () => {
  it.each(FOIL_CLASSES.map((one) => [one.id, one] as const))(
    '%s has its usual Rz inside its range, and fits a line',
    (_, one) => {
      expect(micrometres(one.rz)).toBeGreaterThan(micrometres(one.rzFrom))
      expect(micrometres(one.rz)).toBeLessThan(micrometres(one.rzTo))
      expect(fitsALine(lineFromFoil(one))).toBe(true)
    },
  )

  it('go from rough to smooth', () => {
    const rz = FOIL_CLASSES.map((one) => micrometres(one.rz))
    expect(rz).toEqual([...rz].sort((a, b) => b - a))
  })
})

describe('package sets of IEEE 802.3 (from memory)', () => {
  it.each(PUBLISHED_PACKAGES.map((one) => [one.id, one] as const))(
    '%s fits the schema, and says that it is from memory',
    (_, one) => {
      const { id: _id, ...fields } = one
      expect(packageEntry.parse(fields)).toEqual(fields)
      expect(one.confidence).toBe('from-memory')
      expect(one.caution).toContain('confirm against the standard')
      expect(fitsALine(lineFromPackage(one))).toBe(true)
      expect(lineFromPackage(one)).toMatchObject({ model: 'package-line', length: one.length })
    },
  )

  it('lose 0.0704 dB/mm in their line at 12.890625 GHz in 802.3bj (from memory)', () => {
    // Re γ = γ0 + a1 √f + a2 f with f in GHz (Annex 93A, from memory): 2.111 dB over 30 mm, 0.844 dB over 12 mm.
    const attenuation = (id: string) => {
      const { packageGamma0, packageA1, packageA2, length } = packageOf(id)
      const f = 12.890625
      const nepers = Number(packageGamma0) + Number(packageA1) * Math.sqrt(f) + Number(packageA2) * f
      return nepers * 20 * Math.log10(Math.E) * Number.parseFloat(length ?? '')
    }
    expect(attenuation('bj-30mm')).toBeCloseTo(2.111, 3)
    expect(attenuation('bj-12mm')).toBeCloseTo(0.8444, 4)
  })

  it('have a second section in 802.3ck only', () => {
    const second = PUBLISHED_PACKAGES.filter(({ secondLength }) => secondLength !== null).map(({ id }) => id)
    expect(second).toEqual(['ck-12mm', 'ck-31mm'])
  })
})
