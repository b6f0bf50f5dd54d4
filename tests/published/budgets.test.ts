import { describe, expect, it } from 'vitest'
import { evaluateFile, onlyAllowance, type StraightLink, straightLink } from './straightLink'

const sum = (...decibels: number[]) => decibels.reduce((total, loss) => total + loss, 0)

/** Stripline of 0.5 dB/in and connectors of 2.5 dB, both at 5 GHz. */
function ruleOfThumb(inches: number, connectors: number): StraightLink {
  const parts: Record<string, StraightLink['parts'][string]> = {
    trace: { kind: 'trace', model: 'class', length: `${inches} in`, lossClass: 'stripline', basis: 'estimate' },
  }
  for (let n = 1; n <= connectors; n++) {
    parts[`connector-${n}`] = { kind: 'connector', model: 'stated', loss: '2.5 dB', at: '5 GHz', basis: 'estimate' }
  }
  return {
    head: { bitRate: '10 Gb/s', rateType: 'line', code: 'NRZ', reference: '100 Ω' },
    lossClasses: { stripline: { order: 'a0', lossPerLength: '0.5 dB/in', at: '5 GHz' } },
    parts,
    planes: ['tx-ball', 'rx-ball'],
    allowance: { limit: '25 dB', at: '5 GHz' },
  }
}

describe('a rule of thumb for old backplanes (onlinedocs.microchip.com GUID-AE985A83, table 6-2)', () => {
  it.each([
    [8, 1, 6.5, 'as printed'],
    [24, 2, 17.0, 'as printed'],
    [40, 2, 25.0, 'follows from the same figures'],
  ])('%f in and %i connectors: %f dB, %s', (inches, connectors, expected) => {
    expect(inches * 0.5 + connectors * 2.5).toBe(expected)
    const found = onlyAllowance(evaluateFile(straightLink(ruleOfThumb(inches, connectors))))
    expect(found.lossDb).toBeCloseTo(expected, 9)
    expect(found.marginDb).toBeCloseTo(25 - expected, 9)
    expect(found.verdict).toBe('inside')
  })
})

describe('splits by assembly that close', () => {
  const at = '16 GHz'
  const part = (kind: 'package' | 'other' | 'connector', loss: string) =>
    ({ kind, model: 'stated', loss, at, basis: 'target' }) as const
  const slot: StraightLink = {
    head: { bitRate: '32 GT/s', rateType: 'line', code: 'NRZ', reference: '85 Ω' },
    parts: {
      root: part('package', '9 dB'),
      board: part('other', '16 dB'),
      slot: part('connector', '1.5 dB'),
      card: part('package', '9.5 dB'),
    },
    planes: ['tx-bump', 'rx-bump'],
    allowance: { limit: '36 dB', at },
  }

  it('9 + 16 + 1.5 + 9.5 = 36 dB at 16 GHz (asteralabs.com, tag pci-sig, and a mirrored article)', () => {
    const found = onlyAllowance(evaluateFile(straightLink(slot)))
    expect(sum(9, 16, 1.5, 9.5)).toBe(36)
    expect(found.lossDb).toBeCloseTo(36, 9)
    expect(found.marginDb).toBeCloseTo(0, 9)
    expect(found.verdict).toBe('inside')
  })

  it('a card vendor’s three parts do not fit the 9.5 dB of the card (docs.nvidia.com, connectx8supernic)', () => {
    const card: StraightLink = {
      ...slot,
      parts: { adapter: part('other', '5 dB'), auxiliary: part('other', '2.5 dB'), harness: part('other', '3.5 dB') },
      planes: ['board-edge', 'rx-bump'],
      allowance: { limit: '9.5 dB', at },
    }
    const found = onlyAllowance(evaluateFile(straightLink(card)))
    expect(found.lossDb).toBeCloseTo(sum(5, 2.5, 3.5), 9)
    expect(found.marginDb).toBeCloseTo(-1.5, 9)
    expect(found.verdict).toBe('over')
  })

  const clause: StraightLink = {
    head: { bitRate: '106.25 Gb/s', rateType: 'line', code: 'PAM4', reference: '100 Ω' },
    parts: {
      'host-a': { kind: 'other', model: 'stated', loss: '10.975 dB', at: '26.5625 GHz' },
      'fixture-a': overlap('host-a', 'cable'),
      cable: { kind: 'cable', model: 'stated', loss: '19.75 dB', at: '26.5625 GHz' },
      'fixture-b': overlap('cable', 'host-b'),
      'host-b': { kind: 'other', model: 'stated', loss: '10.975 dB', at: '26.5625 GHz' },
    },
    planes: ['tp0', 'tp5'],
    allowance: { limit: '28.5 dB', at: '26.5625 GHz' },
  }

  it('19.75 + 2 × 10.975 − 2 × 6.6 = 28.50 dB: a copper cable of the 112 Gb/s class, fixtures counted once (from memory)', () => {
    const evaluation = evaluateFile(straightLink(clause))
    const found = onlyAllowance(evaluation)
    expect(found.lossDb).toBeCloseTo(19.75 + 2 * 10.975 - 2 * 6.6, 9)
    expect(found.lossDb).toBeCloseTo(28.5, 9)
    expect(found.lines.map((line) => line.countedDb)).toEqual([10.975, -6.6, 19.75, -6.6, 10.975])
    // What closes exactly on paper is not over for the last bit of a sum.
    expect(found.marginDb).toBeCloseTo(0, 9)
    expect(found.verdict).toBe('inside')
    expect(evaluation.flags.filter((flag) => flag.severity === 'problem')).toEqual([])
  })

  it('the same cable without the overlap lines is 13.2 dB over (arithmetic, no source)', () => {
    const { 'fixture-a': _a, 'fixture-b': _b, ...parts } = clause.parts
    const found = onlyAllowance(evaluateFile(straightLink({ ...clause, parts })))
    expect(found.marginDb).toBeCloseTo(28.5 - sum(10.975, 19.75, 10.975), 9)
    expect(found.verdict).toBe('over')
  })

  it('17.16 + 2 × 10.07 − 2 × 3.65 = 30.00 dB: the 53 Gb/s class (from memory)', () => {
    const fixture = (a: string, b: string) => ({ ...overlap(a, b), loss: '3.65 dB', at: '13.28125 GHz' }) as const
    const host = { kind: 'other', model: 'stated', loss: '10.07 dB', at: '13.28125 GHz' } as const
    const found = onlyAllowance(
      evaluateFile(
        straightLink({
          head: { bitRate: '53.125 Gb/s', rateType: 'line', code: 'PAM4', reference: '100 Ω' },
          parts: {
            'host-a': host,
            'fixture-a': fixture('host-a', 'cable'),
            cable: { kind: 'cable', model: 'stated', loss: '17.16 dB', at: '13.28125 GHz' },
            'fixture-b': fixture('cable', 'host-b'),
            'host-b': host,
          },
          planes: ['tp0', 'tp5'],
          allowance: { limit: '30 dB', at: '13.28125 GHz' },
        }),
      ),
    )
    expect(found.lossDb).toBeCloseTo(17.16 + 2 * 10.07 - 2 * 3.65, 9)
    expect(found.lossDb).toBeCloseTo(30, 9)
    expect(found.verdict).toBe('inside')
  })
})

/** A mated test fixture that both neighbours contain. */
function overlap(overlapA: string, overlapB: string) {
  return { kind: 'overlap', model: 'stated', loss: '6.6 dB', at: '26.5625 GHz', overlapA, overlapB } as const
}
