export type { TouchstoneFile, TouchstoneProblem, TouchstoneWarning } from './file'
export { readTouchstone } from './read'
export { type WriteOptions, writeTouchstone } from './write'
