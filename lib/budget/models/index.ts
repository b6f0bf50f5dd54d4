import { LANE_FIELDS, type Line, type ModelType } from '../schema'
import { lossClass } from './lossClass'
import type { Model } from './model'
import { pad } from './pad'
import { perLength } from './perLength'
import { stated } from './stated'
import { table } from './table'

export type { ModelInput, ModelLoss } from './model'

/** A model that the schema knows and this version gives no number for. */
const notComputed: Model = ({ fields, line }) =>
  fields.say(
    'model-not-computed',
    'model',
    `${fields.name}: this version does not compute the model '${line.model}'.`,
    "Choose 'stated' and type the loss with its frequency and where it comes from; the fields of the model are kept.",
  )

const MODELS: Readonly<Record<ModelType, Model>> = {
  stated,
  class: lossClass,
  'per-length': perLength,
  table,
  pad,
  geometry: notComputed,
  via: notComputed,
  'package-line': notComputed,
  'ac-capacitor': notComputed,
  cable: notComputed,
  network: notComputed,
}

/** The fields that may differ from lane to lane and that a model reads; skew is read with every model. */
const LANE_FIELDS_READ: Readonly<Record<string, readonly (typeof LANE_FIELDS)[number][]>> = {
  stated: ['loss', 'skew'],
  class: ['length', 'lossClass', 'skew'],
  'per-length': ['length', 'skew'],
  table: ['skew'],
  pad: ['skew'],
}

/** Lane fields that the line's model does not read; none for a model that is missing or not computed. */
export function laneFieldsNotRead(line: Line): readonly string[] {
  const read = line.model === null ? undefined : LANE_FIELDS_READ[line.model]
  return read ? LANE_FIELDS.filter((field) => !read.includes(field)) : []
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
