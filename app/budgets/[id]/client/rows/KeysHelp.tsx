'use client'
import { useBench } from '../state/contexts'
import css from './help.module.css'

const MOVING = [
  ['arrows', 'move'],
  ['Tab', 'along the row, then out'],
  ['Home End', 'ends of the row'],
  ['Page Up, Page Down', 'ten rows'],
] as const
const WRITING = [
  ['Enter, F2 or typing', 'edit'],
  ['Enter', 'take'],
  ['Escape', 'restore'],
  ['Insert', 'line below'],
  ['Alt ↑ ↓', 'move the row'],
  ['Delete on its number', 'take it out'],
  ['Ctrl Z, Ctrl Shift Z', 'undo and redo your own'],
] as const

/** What the keys do in the rows. */
export function KeysHelp() {
  const { canWrite } = useBench()
  const keys = canWrite ? [...MOVING, ...WRITING] : MOVING
  return (
    <dl className={css.help} aria-label="Keys in the rows">
      {keys.map(([key, does]) => (
        <div key={key}>
          <dt>
            <kbd>{key}</kbd>
          </dt>
          <dd>{does}</dd>
        </div>
      ))}
    </dl>
  )
}
