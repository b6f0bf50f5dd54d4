import { describe, expect, it } from 'vitest'
import { type Network, network } from '../../../lib/channel/networks/network'
import { causality, largestElement, passivity, reciprocity, throughFacts } from '../../../lib/channel/quality'
import { causalLine, multiples, reversed } from './networks'

const HZ = multiples(10, 1e9)
/** The same real two-port at ten frequencies, with other values at some. */
function twoPort(s: readonly number[], others: Record<number, readonly number[]> = {}): Network {
  const all = new Float64Array(80)
  for (let f = 0; f < 10; f++) for (const [i, value] of (others[f] ?? s).entries()) all[8 * f + 2 * i] = value
  return network(2, HZ, all, 50)
}

describe('passivity (IEEE Std 370, initial quality check; figures by hand)', () => {
  it('is 100 % up to a singular value of 1.00001', () => {
    expect(passivity(twoPort([0, 1, 1, 0]))).toEqual({ percent: 100, grade: 'good', largest: { value: 1, hz: 1e9 } })
    expect(passivity(twoPort([0, 1.00001, 1.00001, 0])).percent).toBe(100)
  })

  it.each([
    [1.00002, 99.999, 'good'],
    [1.0002, 99.981, 'good'],
    [1.02001, 98, 'inconclusive'],
    [1.005, 99.501, 'acceptable'],
    [1.1, 90.001, 'inconclusive'],
    [1.3, 70.001, 'poor'],
    [2.5, 0, 'poor'],
  ])('with |S21| = %d at one of ten: each frequency takes off what it exceeds in tenths', (gain, percent, grade) => {
    const found = passivity(twoPort([0, 1, 1, 0], { 6: [0, 1, gain, 0] }))
    expect(found.percent).toBeCloseTo(percent, 9)
    expect(found.grade).toBe(grade)
    expect(found.largest).toEqual({ value: gain, hz: 7e9 })
  })

  it('sees gain that no single element shows: two waves of 0.8 in phase', () => {
    const found = passivity(twoPort([0.8, 0.8, 0.8, 0.8]))
    expect(found.largest.value).toBeCloseTo(1.6, 12)
    expect(found.percent).toBe(0)
  })
})

describe('reciprocity (IEEE Std 370, initial quality check; figures by hand)', () => {
  it.each([
    [0, 100, 'good'],
    [1e-6, 100, 'good'],
    [5e-5, 99.951, 'good'],
    [5e-4, 99.501, 'acceptable'],
    [5e-3, 95.001, 'inconclusive'],
    [0.05, 50.001, 'poor'],
  ])('with |S21 − S12| = %d everywhere is %d %', (differs, percent, grade) => {
    const found = reciprocity(twoPort([0, 0.5, 0.5 + differs, 0]))
    expect(found?.percent).toBeCloseTo(percent, 9)
    expect(found?.grade).toBe(grade)
    expect(found?.largest.value).toBeCloseTo(differs, 12)
  })

  it('says where and between which ports; a one-port has none', () => {
    const found = reciprocity(twoPort([0, 0.5, 0.5, 0], { 3: [0, 0.5, 0.6, 0] }))
    expect(found?.largest).toMatchObject({ hz: 4e9, ports: [2, 1] })
    expect(reciprocity(network(1, HZ, new Float64Array(20), 50))).toBeNull()
  })
})

describe('causality (IEEE Std 370, initial quality check)', () => {
  const line = causalLine(multiples(500, 20e6))

  it('is good for a causal line and poor for the same run backwards in time', () => {
    expect(causality(line)).toMatchObject({ grade: 'good' })
    expect(causality(line)?.percent).toBeGreaterThan(99)
    expect(causality(reversed(line))).toMatchObject({ grade: 'poor' })
    expect(causality(reversed(line))?.percent).toBeLessThan(1)
  })

  it('takes the worst element and names it', () => {
    const spoilt = line.s.slice()
    for (let f = 0; f < line.hz.length; f++) spoilt[8 * f + 5] = -(line.s[8 * f + 5] as number)
    expect(causality({ ...line, s: spoilt })).toMatchObject({ grade: 'poor', ports: [2, 1] })
  })

  it('cannot see what the docblock says: a delay put on the reversed line turns it clockwise', () => {
    const late = reversed(line).s.slice()
    for (let f = 0; f < line.hz.length; f++) {
      const turn = -2 * Math.PI * (line.hz[f] as number) * 6e-9
      for (let at = 8 * f; at < 8 * f + 8; at += 2) {
        const [re, im] = [late[at] as number, late[at + 1] as number]
        late[at] = re * Math.cos(turn) - im * Math.sin(turn)
        late[at + 1] = re * Math.sin(turn) + im * Math.cos(turn)
      }
    }
    expect(causality({ ...line, s: late })?.grade).toBe('good')
  })

  it('is unknown where nothing turns', () => {
    expect(causality(twoPort([0, 1, 1, 0]))).toBeNull()
    expect(causality(network(1, multiples(2, 1e9), Float64Array.of(1, 0, 0, 1), 50))).toBeNull()
  })
})

describe('plain facts', () => {
  it('of the largest element', () => {
    expect(largestElement(twoPort([0.1, 0.5, 0.5, 0], { 8: [0.1, 0.5, 0.5, -0.9] }))).toEqual({
      value: 0.9,
      hz: 9e9,
      ports: [2, 2],
    })
  })

  const hz = multiples(500, 20e6)
  it('of a matched line: its delay (600 ps and the slope of √f), next to no loss at the low end, no rise', () => {
    const facts = throughFacts(causalLine(hz, { ohm: 50 }))
    // By hand: 2·√0.002 Np/m over 0.1 m at 20 MHz; the phase of √f adds 0.2 rad over the band, 3.2 ps from end to end.
    expect(facts?.lowest.hz).toBe(20e6)
    expect(facts?.lowest.lossDb).toBeCloseTo(8.685889638 * 0.2 * Math.sqrt(0.002), 9)
    expect((facts?.delay ?? 0) * 1e12).toBeGreaterThan(600)
    expect((facts?.delay ?? 0) * 1e12).toBeLessThan(606)
    expect(facts?.risesDb).toBe(0)
  })

  it('of a loss that falls: the difference of the thirds', () => {
    const falling = twoPort([0, 0.5, 0.5, 0], { 7: [0, 1, 1, 0], 8: [0, 1, 1, 0], 9: [0, 1, 1, 0] })
    expect(throughFacts(falling)?.risesDb).toBeCloseTo(6.0206, 4)
  })

  it('of a delay too long for the step of frequency: unknown', () => {
    expect(throughFacts(causalLine(multiples(50, 700e6)))?.delay).toBeNull()
    expect(throughFacts(twoPort([1, 0, 0, 1]))).toBeNull()
  })

  it('start above 0 Hz', () => {
    expect(throughFacts(causalLine(Float64Array.of(0, ...hz)))?.lowest.hz).toBe(20e6)
  })
})
