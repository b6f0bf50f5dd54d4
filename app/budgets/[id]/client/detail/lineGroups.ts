import type { Line } from '../../../../../lib/budget/schema'
import { modelParameters } from '../typed/modelSlips'

type LineField = keyof Line & string
export type LineGroup = { readonly title: string; readonly fields: readonly LineField[] }

/** The fields of the detail in groups; what a line of this kind and model does not read is left out. */
export function lineGroups(line: Pick<Line, 'kind' | 'model'>): readonly LineGroup[] {
  const special: readonly LineField[] =
    line.kind === 'reserve' ? ['purpose'] : line.kind === 'overlap' ? ['overlapA', 'overlapB'] : []
  return [
    { title: 'What it is', fields: ['name', 'kind', 'assembly', ...special] },
    { title: 'How its loss is found', fields: ['model', ...modelParameters(line.model)] },
    {
      title: 'What the number rests on',
      fields: ['basis', 'grade', 'conditionTemperature', 'conditionHumidity', 'processIncluded', 'evidence'],
    },
    { title: 'Tolerance', fields: ['toleranceMeaning', 'toleranceAnywhere', 'group', 'groupNote'] },
    { title: 'Who answers', fields: ['owner', 'ownerPerson', 'supplier'] },
  ]
}
