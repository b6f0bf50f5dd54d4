export { DIMENSIONS, type Dimension } from './dimensions'
export { isQuantity, parseQuantity, type Quantity, type QuantityRefusal, withUnit } from './parse'
