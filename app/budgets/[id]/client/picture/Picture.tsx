'use client'
import type { Present } from '../../../../../lib/sheet/wire'
import { LevelDiagram } from '../../../../diagram/LevelDiagram'
import type { Was } from '../../../../diagram/was'
import { useLook, useReading, useView } from '../state/contexts'
import { AllowanceSwitch } from './AllowanceSwitch'
import css from './picture.module.css'
import { useWidth } from './useWidth'

/** The level diagram of the allowance in view; nothing where there is none yet. */
export function Picture({ people, was }: { people: readonly Present[]; was: Was | null }) {
  const { allowance } = useView()
  return allowance === null ? null : <PictureOf allowance={allowance} people={people} was={was} />
}

type Props = { readonly allowance: string; readonly people: readonly Present[]; readonly was: Was | null }

function PictureOf({ allowance, people, was }: Props) {
  const { budget, evaluation } = useReading()
  const { selected } = useView()
  const { select } = useLook()
  const { ref, width } = useWidth<HTMLDivElement>()
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
