'use client'
import type { Line } from '../../../../../lib/budget/schema'
import { DisciplineGlyph } from '../../../../marks/DisciplineGlyph'
import { KIND_WORD, OWNER_WORD } from '../../../../words/terms'
import { LineCatalogue } from '../catalogue/LineCatalogue'
import { FieldSlip } from '../slips/FieldSlip'
import { fieldSlip, toleranceSlip } from '../slips/spec'
import { useReading } from '../state/contexts'
import { modelParameters } from '../typed/modelParameters'
import { Beside } from './Beside'
import { Covers } from './Covers'
import css from './detail.module.css'
import { FlagList } from './FlagList'
import { Group } from './Group'
import { Lanes } from './Lanes'
import { LineFigure } from './LineFigure'
import { lineGroups } from './lineGroups'
import { RowDeeds } from './RowDeeds'

/** All fields of a line that its model reads, what its number includes, and what to look at. */
export function LineDetail({ id, line }: { id: string; line: Line }) {
  const { budget, evaluation } = useReading()
  const found = evaluation.lines[id]
  const assembly = line.assembly === null ? null : budget.assemblies[line.assembly]
  return (
    <>
      <div className={css.top}>
        <div>
          <h2 className={css.title}>{line.name || 'Line without a name'}</h2>
          <p className={css.quiet}>
            {[assembly?.name, line.kind ? KIND_WORD[line.kind] : 'kind not said'].filter(Boolean).join(' · ')}
            {found?.owner && (
              <>
                {' · '}
                <DisciplineGlyph owner={found.owner} /> {OWNER_WORD[found.owner]}
              </>
            )}
          </p>
        </div>
        <LineFigure id={id} />
      </div>
      <Beside id={id} />
      {line.removed && <p className={css.gone}>This line is taken out of the budget.</p>}
      <FlagList section="lines" id={id} />
      {lineGroups(line).map(({ title, fields }) => (
        <Group key={title} title={title}>
          <div className={css.slips}>
            {title === 'Tolerance' && <FieldSlip spec={toleranceSlip('lines', id, line)} />}
            {fields.map((field) => (
              <FieldSlip key={field} spec={fieldSlip('lines', id, field, line[field])} />
            ))}
          </div>
          {title === 'How its loss is found' && <LineCatalogue id={id} model={line.model} />}
        </Group>
      ))}
      <Lanes id={id} fields={modelParameters(line)} />
      <Covers id={id} line={line} />
      <Group title="Note">
        <FieldSlip spec={fieldSlip('lines', id, 'note', line.note)} hideLabel of={line.name ?? 'the line'} />
      </Group>
      <RowDeeds row={{ section: 'lines', id }} removed={line.removed} assembly={line.assembly} />
    </>
  )
}
