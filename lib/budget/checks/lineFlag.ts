import type { FlagDraft } from '../flags'
import type { LineItem } from '../lineItem'
import { nameOf } from '../record'

/** A flag on one field of a line; the message goes on after the line's name. */
export function lineFlag(
  item: LineItem,
  code: FlagDraft['code'],
  field: string,
  message: string,
  todo: string,
): FlagDraft {
  return {
    code,
    section: 'lines',
    id: item.id,
    field,
    message: `${nameOf('lines', item.id, item.line)} ${message}`,
    todo,
  }
}
