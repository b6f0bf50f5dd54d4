import { decibels } from '../../../../words/decibels'
import { shortFrequency } from './cascadeFacts'
import type { ChartRow } from './chartRows'
import { nearest } from './drawn'

/** What the readout says of one point, figure by figure. */
export function readoutWords({ hz, loss, fitted, limit, back }: ChartRow): string {
  const parts = [
    loss === null ? 'nothing passes' : `loss ${decibels(loss)} dB`,
    fitted !== null && `fitted ${decibels(fitted)} dB`,
    limit !== null && `limit ${decibels(limit)} dB`,
    limit !== null && loss !== null && (loss > limit ? 'under the ground' : 'above the ground'),
    back !== null && `return loss ${decibels(back)} dB`,
  ]
  return `${shortFrequency(hz)}: ${parts.filter(Boolean).join(' · ')}`
}

/** The rows that the table shows: about a dozen over the band, and those that are asked for. */
export function tableRows(
  rows: readonly ChartRow[],
  marks: readonly (number | null | undefined)[],
): readonly ChartRow[] {
  const band = rows.at(-1)?.hz ?? 0
  const wanted = [
    ...Array.from({ length: 11 }, (_, step) => (band * step) / 10),
    ...marks.flatMap((mark) => mark ?? []),
  ]
  const chosen = new Set(wanted.map((hz) => nearestRow(rows, hz)))
  return rows.filter((_, at) => chosen.has(at))
}

/** The row next to a frequency. */
export function nearestRow(rows: readonly ChartRow[], hz: number): number {
  return nearest(
    rows.map((row) => row.hz),
    hz,
  )
}
