export { type Interpolated, interpolate, interpolateOver } from './interpolate'
export { type Point, type Points, parsePoints } from './parsePoints'
