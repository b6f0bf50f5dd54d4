'use client'
import { lazy, Suspense, useId } from 'react'
import type { AllowanceEvaluation, ChannelEvaluation } from '../../../../../lib/budget/evaluation'
import { LOSS, typedValue } from '../../../../../lib/budget/quantities'
import { plainDecibels } from '../../../../words/decibels'
import { useReading } from '../state/contexts'
import css from '../whole/whole.module.css'
import type { ChartRow, Frame } from './chartRows'
import { LossLegend } from './LossLegend'
import { noReflectionWords } from './lacking'
import { readoutWords } from './readoutWords'

/** The charts' library is large; the words stand before it has come. */
const LossChart = lazy(() => import('./LossChart'))
const ReturnChart = lazy(() => import('./ReturnChart'))

type Props = {
  readonly allowance: AllowanceEvaluation
  readonly channel: ChannelEvaluation
  readonly rows: readonly ChartRow[]
  readonly frame: Frame
  readonly nyquist: number | null
  readonly read: number
  readonly onRead: (row: number) => void
}

/** Loss and return loss over one frequency axis, and one readout for both, which follows the pointer and the arrow keys. */
export function Charts({ allowance, channel, rows, frame, nyquist, read, onRead }: Props) {
  const { budget } = useReading()
  const id = useId()
  const row = rows[read]
  const { limitDb, atHz } = allowance
  const backs = channel.trace.returnLossDb !== null
  const ledge = channel.curve === null && limitDb !== null && atHz !== null ? { hz: atHz, db: limitDb } : null
  const floorDb = typedValue(LOSS, budget.allowances[allowance.id]?.returnLossFloor ?? null)
  const worstDb = channel.returnLoss?.worstDb ?? null
  const worst = channel.returnLoss && worstDb !== null ? { hz: channel.returnLoss.worstAtHz, db: worstDb } : null
  return (
    <>
      <figure className={css.figure}>
        <figcaption>
          Loss in dB over GHz, falling
          <LossLegend channel={channel} ledge={ledge !== null} />
        </figcaption>
        <div aria-hidden="true" className={css.lossChart}>
          <Suspense fallback={null}>
            <LossChart
              rows={rows}
              frame={frame}
              nyquist={nyquist}
              ledge={ledge}
              missed={channel.curve?.missed ?? null}
              read={read}
              onRead={onRead}
            />
          </Suspense>
        </div>
      </figure>
      <figure className={css.figure}>
        <figcaption>
          Return loss in dB over GHz, higher is better
          {floorDb !== null && backs && `; ground: the ${plainDecibels(floorDb)} dB asked for up to Nyquist`}
        </figcaption>
        {!backs && <p className={css.quiet}>{noReflectionWords(budget, allowance)}</p>}
        {backs && (
          <div aria-hidden="true" className={css.returnChart}>
            <Suspense fallback={null}>
              <ReturnChart
                rows={rows}
                toGhz={frame.toGhz}
                nyquist={nyquist}
                floorDb={floorDb}
                worst={worst}
                read={read}
                onRead={onRead}
              />
            </Suspense>
          </div>
        )}
      </figure>
      {row && (
        <div className={css.readout}>
          <label htmlFor={id}>Frequency to read at</label>
          <input
            id={id}
            type="range"
            min={0}
            max={rows.length - 1}
            value={read}
            aria-valuetext={readoutWords(row)}
            onChange={(event) => onRead(Number(event.target.value))}
          />
          <p>{readoutWords(row)}</p>
        </div>
      )}
    </>
  )
}
