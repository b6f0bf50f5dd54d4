import { describe, expect, it } from 'vitest'
import type { PlaneCode } from '../../../lib/budget/schema'
import { line, link } from '../links'
import { flagged, words } from './flagged'

const planes = (from: PlaneCode, to: PlaneCode) => ({ tx: { order: 'a0', code: from }, rx: { order: 'z0', code: to } })
const pack = (order: string, loss = '3 dB') => line(order, loss, { kind: 'package', covers: 'package-trace' })
const trace = line('a5', '4 dB', { kind: 'trace' })
const die = (order: string) => line(order, null, { kind: 'die', model: 'pad', capacitance: '100 fF' })

describe('mistake 3: packages counted from ball to ball, or left out from die to die (practice A7: planes confuse experts)', () => {
  it('a package between two balls', () => {
    const lines = { p: pack('a1'), t: trace }
    expect(flagged('package-between-balls', { lines })).toEqual(['p order'])
    expect(flagged('package-between-balls', { lines, planes: planes('tx-bump', 'rx-bump') })).toEqual([])
    expect(flagged('package-between-balls', { lines: { p: pack('Zz'), t: trace } })).toEqual([])
  })

  it('bump to bump without packages, at each end', () => {
    const bumps = planes('tx-bump', 'rx-bump')
    expect(flagged('no-package-from-bump', { lines: { t: trace }, planes: bumps })).toEqual(['limit from', 'limit to'])
    const lines = { p: pack('a1'), t: trace, q: pack('a6') }
    expect(flagged('no-package-from-bump', { lines, planes: bumps })).toEqual([])
  })

  it('die to die without the pads of the dies, and pads where the limit does not reach them', () => {
    const dies = planes('tx-die', 'rx-die')
    const packages = { p: pack('a2'), t: trace, q: pack('a6') }
    expect(flagged('no-die-from-die', { lines: packages, planes: dies })).toEqual(['limit from', 'limit to'])
    expect(flagged('no-die-from-die', { lines: { ...packages, d: die('a1') }, planes: dies })).toEqual(['limit to'])
    const whole = { ...packages, d: die('a1'), e: die('a7') }
    expect(flagged('no-die-from-die', { lines: whole, planes: dies })).toEqual([])
    expect(flagged('die-outside-planes', { lines: whole, planes: planes('tx-bump', 'rx-bump') })).toEqual([
      'd order',
      'e order',
    ])
  })

  it('a package above what the limit presumes, although it lies outside the planes', () => {
    const { limit } = link({}).allowances
    const allowances = { limit: { ...limit, order: 'a0', presumedPackage: '2.5 dB' } }
    expect(flagged('package-above-presumed', { lines: { p: pack('Zz'), t: trace }, allowances })).toEqual(['p loss'])
    expect(words('package-above-presumed', { lines: { p: pack('Zz'), t: trace }, allowances })).toMatch(
      /3\.00 dB of package at one end; 'Ball to ball' presumes at most 2\.50 dB/,
    )
    expect(flagged('package-above-presumed', { lines: { p: pack('Zz', '2.5 dB'), t: trace }, allowances })).toEqual([])
  })

  it('a limit published between other planes than those it is used at', () => {
    const { limit } = link({}).allowances
    const allowances = { limit: { ...limit, order: 'a0', publishedFrom: 'tx-bump' as const } }
    expect(flagged('planes-differ', { lines: { t: trace }, allowances })).toEqual(['limit from'])
  })
})
