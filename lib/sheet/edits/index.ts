export { type AppliedEdit, applyEdit, captureUpdate, type FieldWrite, TYPED, writeFieldIfStill } from './apply'
export { mergeTyped, spliceBetween } from './noteText'
export { editSize } from './size'
