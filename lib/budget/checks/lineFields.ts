import { readsCount } from '../models'
import { livingRecord, nameOf } from '../record'
import type { Check } from './check'

/** Fields of a line that say something the number does not follow. */
export const lineFields: Check = function* ({ context }) {
  for (const { id, line, lossClass } of context.items) {
    if ((line.count ?? 1) > 1 && !readsCount(line)) {
      yield {
        code: 'count-not-used',
        section: 'lines',
        id,
        field: 'count',
        message: `${nameOf('lines', id, line)} says that it stands for ${line.count} alike, and counts once.`,
        todo: 'State the loss of all of them, or make a line of each.',
      }
    }
    if (lossClass === null || line.assembly === null || lossClass.assembly === null) continue
    if (lossClass.assembly === line.assembly) continue
    const other = livingRecord(context.budget, 'assemblies', lossClass.assembly)
    yield {
      code: 'class-of-other-assembly',
      section: 'lines',
      id,
      field: 'lossClass',
      message: `${nameOf('lines', id, line)} uses the loss class ${nameOf('lossClasses', line.lossClass, lossClass)} of ${nameOf('assemblies', lossClass.assembly, other)}.`,
      todo: 'Choose a loss class of its own assembly.',
    }
  }
}
