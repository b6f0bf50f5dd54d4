'use client'
import type { TrailEntry } from '../../../../../lib/sheet/wire'
import { When } from '../../../../words/client/When'
import { useLook, useReading } from '../state/contexts'
import css from './trail.module.css'
import { deedsOf, effectWords } from './trailWords'

const SHOWN = 4
const DOOR: Readonly<Record<TrailEntry['door'], string>> = {
  screen: '',
  token: ', by a program',
  import: ', imported',
  restore: ', restored',
}

/** One entry: what it did to each margin, what was changed, who and when. */
export function EntryItem({ entry }: { entry: TrailEntry }) {
  const { budget } = useReading()
  const { goTo } = useLook()
  const deeds = deedsOf(entry, budget)
  const effects = entry.effects.flatMap((effect) => effectWords(effect) ?? [])
  return (
    <li className={css.entry}>
      <div className={css.effects}>
        {effects.map(({ allowance, figure, sign, said }) => (
          <span key={allowance} className={css[sign]} title={said}>
            {figure}
            <span className="unseen"> dB, {said}</span>
          </span>
        ))}
        {effects.length === 0 && <span className={css.none}>no change of a margin</span>}
      </div>
      <div>
        {deeds.slice(0, SHOWN).map(({ key, section, id, subject, what }) => (
          <p key={key}>
            <button type="button" className={css.subject} onClick={() => goTo({ section, id, field: null })}>
              {subject}
            </button>{' '}
            {what}
          </p>
        ))}
        {deeds.length > SHOWN && <p className={css.none}>and {deeds.length - SHOWN} more fields</p>}
        <p className={css.who}>
          {entry.personName}
          {DOOR[entry.door]} · <When time={entry.time} />
        </p>
      </div>
    </li>
  )
}
