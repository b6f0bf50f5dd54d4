import type { Line } from '../../../../../lib/budget/schema'
import { canVary, type ModelChoice, modelParameters } from '../typed/modelParameters'

type LineField = keyof Line & string
export type LineGroup = { readonly title: string; readonly fields: readonly LineField[] }

/** The fields of the detail in groups; what a line of this kind and model does not read is left out. */
export function lineGroups(line: Pick<Line, 'kind' | 'varies'> & ModelChoice): readonly LineGroup[] {
  const special: readonly LineField[] =
    line.kind === 'reserve' ? ['purpose'] : line.kind === 'overlap' ? ['overlapA', 'overlapB'] : []
  // What is typed there is shown under another model too: it is flagged as not used.
  const varies: readonly LineField[] = canVary(line) || line.varies !== null ? ['varies'] : []
  const parameters = modelParameters(line)
  const evidence: readonly LineField[] = parameters.includes('evidence') ? [] : ['evidence']
  return [
    { title: 'What it is', fields: ['name', 'kind', 'assembly', ...special] },
    { title: 'How its loss is found', fields: ['model', ...parameters] },
    {
      title: 'What the number rests on',
      fields: ['basis', 'grade', 'conditionTemperature', 'conditionHumidity', 'processIncluded', ...evidence],
    },
    { title: 'Tolerance', fields: ['toleranceMeaning', 'toleranceAnywhere', ...varies, 'group', 'groupNote'] },
    { title: 'Who answers', fields: ['owner', 'ownerPerson', 'supplier'] },
  ]
}
