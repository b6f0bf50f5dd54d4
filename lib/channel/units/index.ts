export { DIMENSIONS, type Dimension } from './dimensions'
export { formatQuantity, formatScaled } from './format'
export { isQuantity, parseQuantity, type Quantity, type QuantityRefusal, withUnit } from './parse'
