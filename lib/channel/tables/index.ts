export { type Interpolated, interpolate } from './interpolate'
export { type Point, type Points, parsePoints } from './parsePoints'
