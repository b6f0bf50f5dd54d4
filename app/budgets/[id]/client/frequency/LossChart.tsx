'use client'
import { memo, useId } from 'react'
import {
  Area,
  ComposedChart,
  Line,
  ReferenceArea,
  ReferenceDot,
  ReferenceLine,
  ResponsiveContainer,
  XAxis,
  YAxis,
} from 'recharts'
import type { CurveEvaluation } from '../../../../../lib/budget/evaluation'
import { roundTicks } from '../trail/margins'
import { BARE_AREA, BARE_LINE, decibelAxis, FREQUENCY_AXIS, MARGIN, pointer, READ_DOT, word } from './chartParts'
import type { ChartRow, Frame } from './chartRows'
import { nearestRow } from './readoutWords'

type Props = {
  readonly rows: readonly ChartRow[]
  readonly frame: Frame
  /** Hz */
  readonly nyquist: number | null
  /** A limit that stands at one frequency only, Hz and dB; null where a curve says more. */
  readonly ledge: { readonly hz: number; readonly db: number } | null
  readonly missed: CurveEvaluation['missed']
  /** The row that the readout shows. */
  readonly read: number
  readonly onRead: (row: number) => void
}

/** A ledge is a little wider than a line, so that it is seen to be ground. */
const LEDGE = 0.012

/**
 * The level over frequency: it falls from the top, the ground of the limit lies below it, the power of the data hangs above.
 * Where a curve is missed the drawing is hatched, says so, and has a post as tall as the excess.
 */
export default memo(function LossChart({ rows, frame, nyquist, ledge, missed, read, onRead }: Props) {
  const hatch = `over${useId().replace(/\W/g, '')}`
  const { toGhz, footDb } = frame
  const row = rows[read]
  const worst = missed && rows[nearestRow(rows, missed.worstAtHz)]
  const half = LEDGE * toGhz
  return (
    <ResponsiveContainer width="100%" height={260}>
      <ComposedChart data={rows} margin={MARGIN} accessibilityLayer={false} onMouseMove={pointer(onRead)}>
        <defs>
          <pattern id={hatch} width="7" height="7" patternUnits="userSpaceOnUse">
            <path d="M-1 1l2-2M0 7l7-7M6 8l2-2" fill="none" stroke="var(--over)" strokeWidth="1.2" />
          </pattern>
        </defs>
        <XAxis {...FREQUENCY_AXIS} domain={[0, toGhz]} ticks={roundTicks(0, toGhz)} />
        <YAxis reversed {...decibelAxis(footDb)} />
        <Area dataKey="cloud" fill="var(--band-2)" fillOpacity={1} stroke="none" {...BARE_AREA} />
        <Area dataKey="ground" fill="var(--ground)" fillOpacity={1} stroke="none" {...BARE_AREA} />
        {ledge && (
          <ReferenceArea
            ifOverflow="hidden"
            x1={Math.max(0, ledge.hz / 1e9 - half)}
            x2={Math.min(toGhz, ledge.hz / 1e9 + half)}
            y1={ledge.db}
            y2={footDb}
            fill="var(--ground)"
            fillOpacity={1}
            stroke="var(--ground-ink)"
            label={word('limit', 'insideTop')}
          />
        )}
        {missed && (
          <ReferenceArea
            ifOverflow="hidden"
            x1={missed.fromHz / 1e9}
            x2={missed.toHz / 1e9}
            fill={`url(#${hatch})`}
            fillOpacity={1}
            stroke="var(--over)"
            label={word('missed', 'insideBottom')}
          />
        )}
        {missed && worst?.limit != null && (
          <ReferenceLine
            segment={[
              { x: worst.ghz, y: worst.limit },
              { x: worst.ghz, y: Math.min(footDb, worst.limit + missed.worstDb) },
            ]}
            stroke="var(--over)"
            strokeWidth={4}
          />
        )}
        {nyquist !== null && nyquist / 1e9 <= toGhz && (
          <ReferenceLine
            x={nyquist / 1e9}
            stroke="var(--ink-2)"
            strokeDasharray="2 3"
            label={word('Nyquist', 'insideTopRight')}
          />
        )}
        {row && <ReferenceLine x={row.ghz} stroke="var(--rule-2)" />}
        <Line dataKey="limit" stroke="var(--ground-ink)" strokeWidth={2} {...BARE_LINE} />
        <Line dataKey="loss" stroke="var(--signal)" strokeWidth={2.5} {...BARE_LINE} />
        <Line dataKey="fitted" stroke="var(--ink)" strokeWidth={1} {...BARE_LINE} />
        {row?.loss != null && row.loss <= footDb && <ReferenceDot x={row.ghz} y={row.loss} {...READ_DOT} />}
      </ComposedChart>
    </ResponsiveContainer>
  )
})
