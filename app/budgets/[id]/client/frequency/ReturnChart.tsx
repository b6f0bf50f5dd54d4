'use client'
import { memo } from 'react'
import {
  ComposedChart,
  Line,
  ReferenceArea,
  ReferenceDot,
  ReferenceLine,
  ResponsiveContainer,
  XAxis,
  YAxis,
} from 'recharts'
import { roundTicks } from '../trail/margins'
import { BARE_LINE, decibelAxis, FREQUENCY_AXIS, MARGIN, pointer, READ_DOT, word } from './chartParts'
import type { ChartRow } from './chartRows'

type Props = {
  readonly rows: readonly ChartRow[]
  readonly toGhz: number
  /** Hz */
  readonly nyquist: number | null
  /** Least return loss up to Nyquist, dB; null: none asked for. */
  readonly floorDb: number | null
  readonly worst: { readonly hz: number; readonly db: number } | null
  readonly read: number
  readonly onRead: (row: number) => void
}

/** More comes back as good as not at all. */
const TOP_DB = 40

/** Return loss over frequency: higher is better, and the ground is what is asked for up to Nyquist. */
export default memo(function ReturnChart({ rows, toGhz, nyquist, floorDb, worst, read, onRead }: Props) {
  const row = rows[read]
  const under = floorDb !== null && worst !== null && worst.db < floorDb
  return (
    <ResponsiveContainer width="100%" height={150}>
      <ComposedChart data={rows} margin={MARGIN} accessibilityLayer={false} onMouseMove={pointer(onRead)}>
        <XAxis {...FREQUENCY_AXIS} domain={[0, toGhz]} ticks={roundTicks(0, toGhz)} />
        <YAxis {...decibelAxis(TOP_DB)} />
        {floorDb !== null && (
          <ReferenceArea
            ifOverflow="hidden"
            x1={0}
            x2={Math.min(toGhz, (nyquist ?? Number.POSITIVE_INFINITY) / 1e9)}
            y1={0}
            y2={floorDb}
            fill="var(--ground)"
            fillOpacity={1}
            stroke="var(--ground-ink)"
          />
        )}
        {nyquist !== null && nyquist / 1e9 <= toGhz && (
          <ReferenceLine x={nyquist / 1e9} stroke="var(--ink-2)" strokeDasharray="2 3" />
        )}
        {row && <ReferenceLine x={row.ghz} stroke="var(--rule-2)" />}
        {worst && under && (
          <ReferenceLine
            segment={[
              { x: worst.hz / 1e9, y: worst.db },
              { x: worst.hz / 1e9, y: floorDb },
            ]}
            stroke="var(--over)"
            strokeWidth={4}
            label={word('missed', 'insideTopRight')}
          />
        )}
        <Line dataKey="back" stroke="var(--signal)" strokeWidth={2} {...BARE_LINE} />
        {row?.back != null && row.back <= TOP_DB && <ReferenceDot x={row.ghz} y={row.back} {...READ_DOT} />}
      </ComposedChart>
    </ResponsiveContainer>
  )
})
