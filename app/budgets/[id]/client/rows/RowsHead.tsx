import { ColumnHeader, Row } from './parts'
import css from './rows.module.css'

const COLUMNS = ['no.', 'line', 'as typed', 'dB', 'tolerance', 'basis', 'grade', 'answers', 'covers', 'flags'] as const

/** Heads of the columns; on cards the values say themselves what they are. */
export function RowsHead() {
  return (
    <Row className={css.heads}>
      {COLUMNS.map((column) => (
        <ColumnHeader key={column} className={column === 'dB' ? css.right : undefined}>
          {column}
        </ColumnHeader>
      ))}
    </Row>
  )
}
