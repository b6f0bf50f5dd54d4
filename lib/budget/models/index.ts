import { LANE_FIELDS, type Line, type ModelType } from '../schema'
import { acCapacitor } from './acCapacitor'
import { cable } from './cable'
import { geometry } from './geometry'
import { lossClass } from './lossClass'
import type { Model } from './model'
import { network } from './network/network'
import { packageLine } from './packageLine'
import { pad } from './pad'
import { perLength } from './perLength'
import { stated } from './stated'
import { table } from './table'
import { via } from './via'

export type { ModelInput, ModelLoss } from './model'

const MODELS: Readonly<Record<ModelType, Model>> = {
  stated,
  class: lossClass,
  'per-length': perLength,
  table,
  geometry,
  via,
  pad,
  'package-line': packageLine,
  'ac-capacitor': acCapacitor,
  cable,
  network,
}

/** The fields that may differ from lane to lane and that a model reads; skew is read with every model. */
const LANE_FIELDS_READ: Readonly<Record<ModelType, readonly (typeof LANE_FIELDS)[number][]>> = {
  stated: ['loss', 'skew'],
  class: ['length', 'lossClass', 'skew'],
  'per-length': ['length', 'skew'],
  table: ['skew'],
  geometry: ['length', 'skew'],
  via: ['stub', 'skew'],
  pad: ['skew'],
  'package-line': ['length', 'skew'],
  'ac-capacitor': ['skew'],
  cable: ['length', 'skew'],
  network: ['length', 'skew'],
}

/** Lane fields that the line's model does not read; none for a line without a model. */
export function laneFieldsNotRead(line: Line): readonly string[] {
  if (line.model === null) return []
  const read = LANE_FIELDS_READ[line.model]
  return LANE_FIELDS.filter((field) => !read.includes(field))
}

/** Whether the line's model counts as many as the line says; only vias come alike in a row. */
export function readsCount(line: Line): boolean {
  return line.model === 'via'
}

const modelMissing: Model = ({ fields }) =>
  fields.say(
    'model-missing',
    'model',
    `${fields.name}: how its loss is found is not said.`,
    'Choose a model; a number at a frequency is the simplest.',
  )

export function modelOf(line: Line): Model {
  return line.model === null ? modelMissing : MODELS[line.model]
}
