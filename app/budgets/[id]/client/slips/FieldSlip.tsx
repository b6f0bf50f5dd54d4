'use client'
import { useId } from 'react'
import { metaOf } from '../../../../../lib/sheet/layout'
import { useReading } from '../state/contexts'
import { sayValue } from '../words/say'
import { Aside, Standing, standingColour } from './Aside'
import { Control } from './Control'
import css from './slips.module.css'
import type { SlipSpec } from './spec'
import { useSlip } from './useSlip'

type Props = {
  readonly spec: SlipSpec
  /** Stands in for the label where a column's head already says it. */
  readonly hideLabel?: boolean
  /** Names the record, for those who do not see the row: 'limit of Fabric'. */
  readonly of?: string
}

/** Name of the draft of a slip outside the rows. */
export const formDraft = (key: string) => `${key}@form`

/** A labelled slip outside the rows: always open, in a form or a table. */
export function FieldSlip({ spec, hideLabel = false, of }: Props) {
  const id = useId()
  const slip = useSlip(spec, formDraft(spec.key))
  const place = spec.places[0]
  const meta = place.section === 'laneValues' ? null : metaOf(place.section, place.field)
  const aside = `${id}-aside`
  const name = of ? `${spec.label} of ${of}` : spec.label
  return (
    <span className={`${css.field} ${css.standing}`} data-place={spec.key} data-standing={standingColour(slip.others)}>
      {!hideLabel && (
        <label className={css.label} htmlFor={id} title={meta?.what}>
          {spec.label}
        </label>
      )}
      <span className={css.box}>
        {slip.canWrite ? (
          <Control
            spec={spec}
            slip={slip}
            id={id}
            name={hideLabel ? name : undefined}
            describedBy={slip.draft ? aside : undefined}
          />
        ) : (
          <ReadOnly spec={spec} id={id} name={name} />
        )}
        <Standing others={slip.others} />
      </span>
      <Aside slip={slip} id={aside} />
    </span>
  )
}

function ReadOnly({ spec, id, name }: { spec: SlipSpec; id: string; name: string }) {
  const { budget } = useReading()
  const place = spec.places[0]
  const said = spec.kind === 'choice' ? sayValue(budget, place.section, place.field, spec.text) : spec.text
  return (
    <output id={id} className={css.plain} aria-label={name}>
      {said || '–'}
    </output>
  )
}
