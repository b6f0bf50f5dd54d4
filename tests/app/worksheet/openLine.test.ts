import { describe, expect, it } from 'vitest'
import { type OpenLineContext, readOpenLine } from '../../../app/budgets/[id]/client/typed/openLine'

// The grammar is our own: no outside source. The examples are those that the screen itself shows and those of the design.
const context: OpenLineContext = {
  assemblies: [
    { id: 'card', name: 'Line card' },
    { id: 'bp', name: 'Backplane' },
  ],
  lossClasses: [{ id: 'l14', name: 'L14 6 mil' }],
  at: '26.5625 GHz',
  assembly: 'card',
}
const read = (typed: string) => readOpenLine(typed, context)
const values = (typed: string) => {
  const line = read(typed)
  if ('reason' in line) throw new Error(`'${typed}' was refused: ${line.reason}`)
  return line.row.values
}
const reason = (typed: string) => {
  const line = read(typed)
  if (!('reason' in line)) throw new Error(`'${typed}' was taken as ${line.says}`)
  return line.reason
}

describe('the open line: what it takes', () => {
  it('a stated number, at the frequency of the allowance in view', () => {
    expect(values('via 0.60 dB')).toMatchObject({
      kind: 'via',
      model: 'stated',
      loss: '0.60 dB',
      at: '26.5625 GHz',
      assembly: 'card',
      name: 'Via',
    })
  })
  it('a frequency of its own, with @ or at', () => {
    expect(values('via 0.60 dB @ 16 GHz').at).toBe('16 GHz')
    expect(values('via 0.60 dB at 16GHz').at).toBe('16GHz')
  })
  it('a bare number on a discrete is decibels', () => {
    expect(values('connector 1.35')).toMatchObject({ loss: '1.35 dB', model: 'stated' })
  })
  it('length × loss per length, with ×, x or *', () => {
    for (const mark of ['×', 'x', '*']) {
      expect(values(`trace 5 in ${mark} 0.95 dB/in`)).toMatchObject({
        kind: 'trace',
        model: 'per-length',
        length: '5 in',
        lossPerLength: '0.95 dB/in',
        at: '26.5625 GHz',
      })
    }
    expect(values('cable 3 m × 2.35 dB/m').model).toBe('cable')
  })
  it('length × a loss class by its name', () => {
    expect(values('trace 11.5 in × L14 6 mil')).toMatchObject({ model: 'class', length: '11.5 in', lossClass: 'l14' })
  })
  it('a decimal comma where it can only be one', () => {
    expect(values('trace 3,2 in × 0,95 dB/in')).toMatchObject({ length: '3,2 in', lossPerLength: '0,95 dB/in' })
  })
  it('a reserve with its purpose, on no assembly', () => {
    expect(values('reserve 1 dB temperature')).toMatchObject({
      kind: 'reserve',
      loss: '1 dB',
      purpose: 'temperature',
      assembly: null,
      name: 'Reserve, temperature',
    })
  })
  it('a plane of the list, with a name of its own', () => {
    expect(values('plane RX ball')).toEqual({ code: 'rx-ball', name: null })
    expect(values('plane tp1a host side')).toEqual({ code: 'tp1a', name: 'host side' })
    expect(values('plane board edge')).toEqual({ code: 'board-edge', name: null })
  })
  it('a name before the number; tolerance, basis, grade and assembly after it', () => {
    expect(
      values('connector Backplane connector, near 1.35 dB ± 0.20 dB datasheet typical on Backplane'),
    ).toMatchObject({
      name: 'Backplane connector near',
      loss: '1.35 dB',
      toleranceMinus: '0.20 dB',
      tolerancePlus: '0.20 dB',
      basis: 'datasheet',
      grade: 'typical',
      assembly: 'bp',
    })
    expect(values('component "0201 capacitor" 0.5 dB').name).toBe('0201 capacitor')
    expect(values('trace 7 in × 0.95 dB/in ± 6 % max')).toMatchObject({ tolerancePlus: '6 %', grade: 'maximum' })
  })
  it('a line without a number stays without a number, and says what follows', () => {
    expect(values('via')).toMatchObject({ kind: 'via', model: null })
    expect(values('via')).not.toHaveProperty('loss')
    expect(read('via')).toMatchObject({ says: expect.stringContaining('undecided') })
    expect(values('trace 5 in')).toMatchObject({ model: 'per-length', length: '5 in' })
  })
  it('capacitances: of a component in series, of anything else a pad', () => {
    expect(values('component 100 nF').model).toBe('ac-capacitor')
    expect(values('other pad 80 fF').model).toBe('pad')
  })
})

describe('the open line: what it asks back', () => {
  it.each([
    ['', /no kind of line/],
    ['vai 0.6 dB', /'vai' is no kind of line. Begin with die, package/],
    ['via 0.60 dB blue moon', /Not understood: 'blue', 'moon'/],
    ['via 1,234 dB', /Does 1,234 mean 1234 or 1.234/],
    ['via -1.2 dB', /positive/],
    ['via 0.6 dB 0.7 dB', /0.6 dB and 0.7 dB cannot both hold/],
    ['trace 5', /Add a unit to 5/],
    ['trace 5 in × 4 in', /5 in and 4 in cannot both hold/],
    ['trace 5 in × 0.9 dB/in 3 dB', /one way/],
    ['via 0.6 dB 6 %', /Put ± before 6 %/],
    ['via 0.6 furlong', /'furlong'|unit/],
    ['via ±', /number after ±/],
    ['via 300 dB', /between 0 and 200 dB/],
    ['trace 5 in × 0.95 dB/in on Moon', /no assembly 'Moon'/],
    ['plane moon', /'moon' is not a plane of the list: TX die/],
    ['plane', /Say which plane/],
  ])('%s', (typed, expected) => {
    expect(reason(typed)).toMatch(expected)
  })
})
