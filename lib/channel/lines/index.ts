export { discreteLoss, holdsAt, type Moved, moveUniformLoss } from './moveInFrequency'
export { skewLoss } from './skewLoss'
export { twoTermAttenuation } from './twoTerms'
