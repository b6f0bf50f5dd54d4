import { describe, expect, it } from 'vitest'
import { line, link } from '../links'
import { flagged, words } from './flagged'

const trace = (rest: Parameters<typeof line>[2], loss = '4 dB') => ({
  lines: { t: line('a1', loss, { kind: 'trace', ...rest }) },
})
const { limit } = link({}).allowances
const hot = {
  allowances: { limit: { ...limit, order: 'a0', judgedCorner: 'hot' } },
  corners: { hot: { order: 'a0', name: 'Hot', temperature: '65 °C', lossPerKelvin: '0.12 %/K' } },
}

describe('mistake 6: a typical value taken for a limit, a maximum made larger once more (practice A4: "0.5 dB advised for variation")', () => {
  it('typical over 0.5 dB is flagged, with its basis; smaller is not', () => {
    const connector = (loss: string) => ({
      lines: {
        c: line('a1', loss, { kind: 'connector', covers: 'mating-interface', grade: 'typical', basis: 'datasheet' }),
      },
    })
    expect(flagged('typical-not-maximum', connector('1.35 dB'))).toEqual(['c grade'])
    expect(words('typical-not-maximum', connector('1.35 dB'))).toMatch(
      /typical value \(datasheet\), not a guaranteed maximum/,
    )
    expect(flagged('typical-not-maximum', connector('0.5 dB'))).toEqual([])
  })

  it('by its loss class as well', () => {
    const parts = {
      lossClasses: {
        c: { order: 'a0', name: 'L3', lossPerLength: '1 dB/in', at: '10 GHz', grade: 'typical' as const },
      },
      lines: { t: line('a1', null, { kind: 'trace', model: 'class', lossClass: 'c', length: '4 in', at: null }) },
    }
    expect(flagged('typical-not-maximum', parts)).toEqual(['t grade'])
  })

  it('a maximum with ± on top is flagged; downwards only it is not', () => {
    expect(flagged('maximum-with-tolerance', trace({ grade: 'maximum', tolerancePlus: '6 %' }))).toEqual([
      't tolerancePlus',
    ])
    const down = trace({ grade: 'maximum', toleranceMinus: '6 %', tolerancePlus: '0 dB' })
    expect(flagged('maximum-with-tolerance', down)).toEqual([])
  })

  it('a maximum over temperature put through the hot corner is flagged until it says its temperature', () => {
    expect(flagged('maximum-through-corner', { ...trace({ grade: 'maximum' }), ...hot })).toEqual([
      't conditionTemperature',
    ])
    const said = trace({ grade: 'maximum', conditionTemperature: '65 °C' })
    expect(flagged('maximum-through-corner', { ...said, ...hot })).toEqual([])
    expect(flagged('other-conditions', { ...said, ...hot })).toEqual(['t conditionTemperature'])
  })

  it('what contains the spread of fabrication and has ± on top', () => {
    expect(flagged('process-with-tolerance', trace({ processIncluded: true, tolerancePlus: '0.2 dB' }))).toEqual([
      't processIncluded',
    ])
  })
})
