'use client'
import { FieldSlip } from '../slips/FieldSlip'
import { fieldSlip } from '../slips/spec'
import { useReading } from '../state/contexts'
import css from './head.module.css'

/** What the link is, in words: description and protocol. */
export function LinkWords() {
  const { head } = useReading().budget
  return (
    <div className={css.link}>
      <FieldSlip spec={fieldSlip('head', null, 'description', head.description)} />
      <FieldSlip spec={fieldSlip('head', null, 'protocol', head.protocol)} />
    </div>
  )
}
