'use client'
import { memo } from 'react'
import {
  CartesianGrid,
  Line,
  LineChart,
  ReferenceArea,
  ReferenceLine,
  ResponsiveContainer,
  XAxis,
  YAxis,
} from 'recharts'
import { plainDecibels } from '../../../../words/decibels'
import { roundTicks, type Step } from './margins'

type Props = {
  readonly steps: readonly Step[]
  readonly requiredDb: number
  /** The step that the readout shows. */
  readonly read: number
  readonly onRead: (at: number) => void
}

/** Steps of the margin over the trail; the ground lies below 0. */
export default memo(function MarginChart({ steps, requiredDb, read, onRead }: Props) {
  const data = steps.map((step, at) => ({ at, marginDb: step.marginDb }))
  const known = steps.flatMap(({ marginDb }) => marginDb ?? [])
  const low = Math.min(0, ...known)
  const high = Math.max(requiredDb, 0, ...known)
  const room = Math.max((high - low) * 0.12, 0.2)
  return (
    <ResponsiveContainer width="100%" height={150}>
      <LineChart
        data={data}
        margin={{ top: 6, right: 10, bottom: 4, left: 0 }}
        accessibilityLayer={false}
        onMouseMove={({ activeTooltipIndex }) => {
          const at = Number(activeTooltipIndex)
          if (activeTooltipIndex != null && Number.isInteger(at)) onRead(at)
        }}
      >
        <CartesianGrid horizontal={false} vertical={false} />
        <ReferenceArea y1={low - room} y2={0} fill="var(--ground)" fillOpacity={1} ifOverflow="visible" />
        <ReferenceLine y={0} stroke="var(--ground-ink)" strokeWidth={2} />
        {requiredDb > 0 && <ReferenceLine y={requiredDb} stroke="var(--ink-3)" strokeDasharray="1 4" />}
        <ReferenceLine x={read} stroke="var(--rule-2)" />
        <XAxis dataKey="at" type="number" domain={[0, steps.length - 1]} hide />
        <YAxis
          domain={[low - room, high + room]}
          width={44}
          tick={{ fill: 'var(--ink-3)', fontSize: 12 }}
          tickFormatter={(value: number) => plainDecibels(value)}
          stroke="var(--rule-2)"
          ticks={roundTicks(low - room, high + room)}
        />
        <Line
          dataKey="marginDb"
          type="stepAfter"
          stroke="var(--signal)"
          strokeWidth={2}
          dot={{ r: 2.5, fill: 'var(--sheet)', stroke: 'var(--signal)' }}
          isAnimationActive={false}
          connectNulls={false}
        />
      </LineChart>
    </ResponsiveContainer>
  )
})
