import type { Line, ModelType } from '../schema'
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
