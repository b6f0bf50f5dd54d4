export { mountedCapacitor } from './mountedCapacitor'
export { inductanceCorner, type SeriesCapacitor } from './seriesCapacitor'
