'use client'
import type { Present } from '../../../../../lib/sheet/wire'
import { LevelDiagram } from '../../../../diagram/LevelDiagram'
import type { Was } from '../../../../diagram/was'
import { useReading, useView } from '../state/contexts'
import { AllowanceSwitch } from './AllowanceSwitch'
import css from './picture.module.css'
import { useWidth } from './useWidth'

/** The level diagram of the allowance in view. */
export function Picture({ people, was }: { people: readonly Present[]; was: Was | null }) {
  const { budget, evaluation } = useReading()
  const { allowance, selected, select } = useView()
  const { ref, width } = useWidth<HTMLDivElement>()
  if (allowance === null) return null
  return (
    <section aria-label="Level diagram" className={css.picture}>
      <AllowanceSwitch />
      <div ref={ref} className={css.frame}>
        {width > 0 && (
          <LevelDiagram
            budget={budget}
            evaluation={evaluation}
            allowance={allowance}
            selected={selected?.section === 'lines' ? selected.id : null}
            onSelect={(id) => select({ section: 'lines', id })}
            present={people.filter((person) => !person.me)}
            was={was}
            width={width}
          />
        )}
      </div>
    </section>
  )
}
