'use client'
import { useState } from 'react'
import { FieldSlip } from '../slips/FieldSlip'
import { fieldSlip } from '../slips/spec'
import { useReading } from '../state/contexts'
import css from './head.module.css'
import { LinkWords } from './LinkWords'
import { signallingFacts, signallingLine } from './signallingFacts'

const ALWAYS = ['bitRate', 'rateType', 'code', 'reference', 'laneCount', 'referenceTemperature'] as const
const SHAPES = ['edgeTime', 'seed'] as const
const CODING = ['codedBits', 'codedSymbols', 'codingBits', 'codingLineBits', 'fecMessage', 'fecCodeword'] as const

/** The link and its signalling as slips, and what follows from them. Folded at first where the rate is known. */
export function Signalling() {
  const { budget, evaluation } = useReading()
  const { head } = budget
  const { signalling } = evaluation
  const [open, setOpen] = useState(signalling.nyquist === null)
  const slips = (fields: readonly (keyof typeof head & string)[]) =>
    fields.map((field) => <FieldSlip key={field} spec={fieldSlip('head', null, field, head[field])} />)
  return (
    <details className={css.signalling} open={open} onToggle={(event) => setOpen(event.currentTarget.open)}>
      <summary>
        <span className={css.summaryTitle}>Signalling</span> {signallingLine(head, signalling)}
      </summary>
      <LinkWords />
      <div className={css.slips}>{slips(ALWAYS)}</div>
      <fieldset className={css.coding}>
        <legend>Spectrum and random builds</legend>
        <div className={css.slips}>{slips(SHAPES)}</div>
      </fieldset>
      <fieldset className={css.coding}>
        <legend>Coding and FEC</legend>
        <div className={css.slips}>{slips(CODING)}</div>
      </fieldset>
      <dl className={css.facts}>
        {signallingFacts(signalling).map(({ term, value }) => (
          <div key={term}>
            <dt>{term}</dt>
            <dd>{value}</dd>
          </div>
        ))}
      </dl>
      <p className={css.statement}>{signalling.statement}</p>
    </details>
  )
}
