'use client'
import { useMemo, useState } from 'react'
import type { AllowanceEvaluation, ChannelEvaluation, Evaluation } from '../../../../../lib/budget/evaluation'
import { useReading } from '../state/contexts'
import { Facts } from '../whole/Facts'
import css from '../whole/whole.module.css'
import { Charts } from './Charts'
import { cascadeFacts } from './cascadeFacts'
import { chartRows, drawnOf, frameOf } from './chartRows'
import { LackingList } from './LackingList'
import { withoutBand, withoutReflection } from './lacking'
import { powerOf } from './power'
import { ReadTable } from './ReadTable'
import { nearestRow } from './readoutWords'

type Props = {
  readonly allowance: AllowanceEvaluation
  readonly channel: ChannelEvaluation
  readonly evaluation: Evaluation
}

/** The cascade between the planes: drawings with a readout, its figures in words, and which lines lack what. */
export function OverFrequency({ allowance, channel, evaluation }: Props) {
  const { budget } = useReading()
  const { signalling } = evaluation
  const { nyquist, symbolRate } = signalling
  const marks = [allowance.atHz, nyquist, channel.curve?.missed?.worstAtHz, channel.returnLoss?.worstAtHz]
  // biome-ignore lint/correctness/useExhaustiveDependencies: marks are of the same evaluation as the channel
  const { rows, frame, power } = useMemo(() => {
    const drawn = drawnOf(channel, marks)
    const frame = frameOf(allowance.limitDb, channel, symbolRate)
    const hz = drawn.map((at) => channel.trace.hz[at] ?? 0)
    const power = powerOf(signalling, budget.head, hz)
    return { rows: chartRows(channel, drawn, frame, power?.density ?? null), frame, power }
  }, [channel, allowance, signalling, symbolRate, budget.head])
  // Kept as a frequency: the next evaluation may have another grid.
  const [readHz, setReadHz] = useState<number | null>(null)
  const read = nearestRow(rows, readHz ?? allowance.atHz ?? nyquist ?? 0)
  return (
    <div className={css.columns}>
      <div className={css.drawings}>
        <Charts
          allowance={allowance}
          channel={channel}
          rows={rows}
          frame={frame}
          nyquist={nyquist}
          read={read}
          onRead={(row) => setReadHz(rows[row]?.hz ?? null)}
        />
        {power && (
          <p className={css.quiet}>
            {power.words}
            {
              ' The faint area that hangs from the top is its density: the lower it reaches, the more of the signal lies there.'
            }
          </p>
        )}
      </div>
      <div className={css.words}>
        <Facts label="The cascade in figures" facts={cascadeFacts(allowance, channel)} />
        <LackingList title="Without data over the band, so not in the cascade" lines={withoutBand(budget, allowance)} />
        <LackingList
          title="In it by their attenuation only, without reflections"
          lines={withoutReflection(budget, allowance)}
        />
        <ReadTable rows={rows} marks={marks} />
      </div>
    </div>
  )
}
