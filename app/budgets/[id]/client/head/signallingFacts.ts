import type { SignallingEvaluation } from '../../../../../lib/budget/evaluation'
import type { Head } from '../../../../../lib/budget/schema'
import { frequencyWords } from '../../../../words/decibels'

/** What follows from rate and code, each with its unit; 'unknown' where the slips do not say enough. */
export function signallingFacts(signalling: SignallingEvaluation): readonly { term: string; value: string }[] {
  const { bitsPerSymbol, symbolRate, unitInterval, nyquist, lineRate } = signalling
  return [
    { term: 'line rate', value: lineRate === null ? 'unknown' : `${figures(lineRate / 1e9)} Gb/s` },
    { term: 'bits per symbol', value: bitsPerSymbol === null ? 'unknown' : figures(bitsPerSymbol) },
    { term: 'symbol rate', value: symbolRate === null ? 'unknown' : `${figures(symbolRate / 1e9)} GBd` },
    { term: 'unit interval', value: unitInterval === null ? 'unknown' : `${figures(unitInterval * 1e12, 5)} ps` },
    { term: 'Nyquist', value: nyquist === null ? 'unknown' : frequencyWords(nyquist) },
  ]
}

/** The same in one line, for the folded block. */
export function signallingLine(head: Head, signalling: SignallingEvaluation): string {
  return [
    head.protocol,
    [head.bitRate, head.code].filter(Boolean).join(' '),
    signalling.nyquist === null ? 'Nyquist unknown' : `Nyquist ${frequencyWords(signalling.nyquist)}`,
    head.reference && `reference ${head.reference}`,
    head.laneCount && `${head.laneCount} ${head.laneCount === 1 ? 'lane' : 'lanes'}`,
  ]
    .filter(Boolean)
    .join(' · ')
}

const figures = (value: number, digits = 7) => String(Number(value.toPrecision(digits)))
