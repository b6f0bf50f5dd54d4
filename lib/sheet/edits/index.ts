export { type AppliedEdit, applyEdit, captureUpdate, type FieldWrite, TYPED, WRITTEN } from './apply'
export { type EditRefusal, refuseEdit } from './judge'
export { mergedText, mergeTyped, type Splice, spliceBetween } from './noteText'
export { editSize } from './size'
