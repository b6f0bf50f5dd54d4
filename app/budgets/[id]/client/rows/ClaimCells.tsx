'use client'
import type { Line } from '../../../../../lib/budget/schema'
import { BasisStroke } from '../../../../marks/BasisStroke'
import { DisciplineGlyph } from '../../../../marks/DisciplineGlyph'
import { TypicalWave } from '../../../../marks/TypicalWave'
import { BASIS_WORD, GRADE_WORD, OWNER_WORD } from '../../../../words/terms'
import { fieldSlip } from '../slips/spec'
import { wordOf } from '../words/choices'
import { GoCell } from './GoCell'
import { GridCell } from './GridCell'
import type { LineFacts } from './rowFacts'
import css from './rows.module.css'

type Props = { readonly id: string; readonly line: Line; readonly of: string; readonly facts: LineFacts }

/** What the number rests on and claims, who answers for it, what it includes, and what to look at. */
export function ClaimCells({ id, line, of, facts }: Props) {
  const { basis, grade, owner, flags, problems } = facts
  const inherited = (own: unknown) => (own === null ? css.inherited : undefined)
  return (
    <>
      <GridCell spec={fieldSlip('lines', id, 'basis', line.basis)} of={of} look="text" className={css.basis}>
        <span className={inherited(line.basis)}>
          <BasisStroke basis={basis} length={24} /> {basis ? BASIS_WORD[basis] : 'not said'}
        </span>
      </GridCell>
      <GridCell spec={fieldSlip('lines', id, 'grade', line.grade)} of={of} look="text" className={css.grade}>
        <span className={inherited(line.grade)}>
          {grade === 'typical' && <TypicalWave />} {GRADE_WORD[grade]}
        </span>
      </GridCell>
      <GridCell spec={fieldSlip('lines', id, 'owner', line.owner)} of={of} look="text" className={css.owner}>
        <span className={inherited(line.owner)}>
          {owner ? (
            <>
              <DisciplineGlyph owner={owner} /> {OWNER_WORD[owner]}
            </>
          ) : (
            'nobody yet'
          )}
        </span>
      </GridCell>
      <GoCell id={id} field="covers" label="covers" className={css.covers}>
        {coversWords(line.covers)}
      </GoCell>
      <GoCell id={id} field="flags" label="flags" className={css.flags}>
        {flags > 0 && (
          <span className={problems > 0 ? css.problem : css.notice}>
            <span aria-hidden="true">{flags}</span>
            <span className="unseen">{`${flags} to look at, ${problems} of them problems`}</span>
          </span>
        )}
      </GoCell>
    </>
  )
}

/** Not said is not the same as nothing. */
function coversWords(covers: string | null): string {
  if (covers === null) return 'not said'
  return covers === '' ? 'its own piece only' : covers.split(' ').map(wordOf).join(', ')
}
